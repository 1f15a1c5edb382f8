import { seedAccounts } from './accounts';
import { seedLayouts } from './layouts';
import type { Platform } from '@/server/context';

/**
 * Fills the demo data on the first run and never again, so that what was deleted stays deleted. Every part adds only
 * what is missing, so a first run that was broken off is finished by the next.
 */
export const seedDemo = async (platform: Platform): Promise<void> => {
  const { db, config } = platform;
  if (!config.demo.data || config.demo.password === undefined) return;
  if (await db.Seeding.findByPk('demo')) return;
  await seedAccounts(platform, config.demo.password);
  await seedLayouts(platform);
  await db.Seeding.create({ name: 'demo' });
};
