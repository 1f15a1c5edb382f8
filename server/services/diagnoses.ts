import { LRUCache } from 'lru-cache';
import { spendComputing } from './computing-limit';
import { requireSoundLayout, spendForDocument } from './layout-check';
import { publishedVersionId } from './published-layouts';
import { buildLayoutIndex, diagnose, type LayoutIndex } from '@/lib';
import type { Context } from '@/server/context';
import { readStoredDocument } from '@/server/models/layout-version';
import type { Diagnosis } from '@/shared';
import type { DiagnosisRequest } from '@/shared/api/diagnoses';

/** Indexes of published versions. What a version says never changes, so its id is the key. */
const indexes = new LRUCache<string, LayoutIndex>({ max: 64 });

/**
 * What the workspace would show for a board and runs of evidence; nothing is stored. Throws `not-found` or
 * `layout-retired` for a board, `layout-invalid` with all problems for a document that has an error. Evidence that
 * cannot be read is no error: the diagnosis tells why.
 */
export const diagnoseRuns = async (context: Context, { layout, runs }: DiagnosisRequest): Promise<Diagnosis> => {
  const index = typeof layout === 'string' ? await publishedIndex(context, layout) : sentIndex(context, layout);
  return diagnose(index, runs);
};

const sentIndex = (context: Context, sent: unknown): LayoutIndex => {
  spendForDocument(context, sent);
  return buildLayoutIndex(requireSoundLayout(sent).document);
};

const publishedIndex = async (context: Context, slug: string): Promise<LayoutIndex> => {
  const versionId = await publishedVersionId(context, slug);
  const index = indexes.get(versionId) ?? (await loadIndex(context, versionId));
  spendComputing(context, { of: 'published', sockets: index.document.sockets.length });
  return index;
};

const loadIndex = async (context: Context, versionId: string): Promise<LayoutIndex> => {
  const version = await context.db.LayoutVersion.findByPk(versionId);
  if (!version) throw new RangeError(`the published version ${versionId} is missing`);
  const index = buildLayoutIndex(readStoredDocument(version));
  indexes.set(versionId, index);
  return index;
};
