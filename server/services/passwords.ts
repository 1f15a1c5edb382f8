import bcrypt from 'bcryptjs';
import type { Config } from '@/server/config';

/** Hashes a password with bcrypt at the configured cost. */
export const hashPassword = (config: Config, password: string): Promise<string> =>
  bcrypt.hash(password, config.bcryptCost);

const standIns = new Map<number, Promise<string>>();

/** A hash that no password has, at the same cost, so that an unknown address takes the same time as a known one. */
const standIn = (cost: number): Promise<string> => {
  const known = standIns.get(cost) ?? bcrypt.hash('nobody has this password', cost);
  standIns.set(cost, known);
  return known;
};

/** Compares a password with a hash; without a hash it takes the same time and says no. */
export const passwordMatches = async (config: Config, password: string, hash: string | undefined): Promise<boolean> => {
  const matches = await bcrypt.compare(password, hash ?? (await standIn(config.bcryptCost)));
  return matches && hash !== undefined;
};
