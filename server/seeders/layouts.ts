import { demoBoards } from './boards';
import { sandvoeTg3 } from './boards/sandvoe-tg3';
import type { Context, Platform } from '@/server/context';
import { emailKeyOf } from '@/server/services/sign-up';
import { importLayout } from '@/server/services/layout-import';
import { publishVersion } from '@/server/services/layout-reviews';
import type { LayoutDocumentInput } from '@/shared';

/** Whose boards they are, and who let them in: two of the demo accounts. */
const author = 'contributor@rowcall.example';
const reviewer = 'moderator@rowcall.example';

/** A second version that waits for a moderator, so that the list of reviews has something to show. */
const waiting: LayoutDocumentInput = {
  ...sandvoeTg3,
  sources: [
    ...(sandvoeTg3.sources ?? []),
    { title: 'Gauge hut 14, IC42 replaced', kind: 'repair', year: 2024, proves: 'Display code E-5.' },
  ],
  examples: [
    ...(sandvoeTg3.examples ?? []),
    { format: 'display', text: 'E-5', sockets: ['IC42'], source: 'Repair at gauge hut 14, 2024.' },
  ],
};

const contextOf = async (platform: Platform, email: string): Promise<Context> => {
  const user = await platform.db.User.findOne({ where: { emailKey: emailKeyOf(email) } });
  if (!user) throw new RangeError(`the demo account ${email} is missing`);
  const who = { standing: user.role, userId: user.id, sessionId: '', by: 'bearer' } as const;
  return { ...platform, who, requestId: 'demo data', ip: '' };
};

/** Publishes the demo boards that are missing, and sends the version that waits. */
export const seedLayouts = async (platform: Platform): Promise<void> => {
  const contributor = await contextOf(platform, author);
  const moderator = await contextOf(platform, reviewer);
  for (const { slug, document } of demoBoards) {
    const version =
      (await findVersion(platform, slug, 1)) ?? (await importLayout(contributor, { document, slug })).version;
    if (version.state !== 'submitted') continue;
    await publishVersion(moderator, { id: version.id, change: version.change, quiet: true });
  }
  const shown = demoBoards.find(({ document }) => document === sandvoeTg3);
  if (shown && !(await findVersion(platform, shown.slug, 2))) await importLayout(contributor, { document: waiting });
};

const findVersion = async ({ db }: Platform, slug: string, number: number) => {
  const layout = await db.Layout.findOne({ where: { slug } });
  return layout && db.LayoutVersion.findOne({ where: { layoutId: layout.id, number } });
};
