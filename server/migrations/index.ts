import { accounts } from './001-accounts';
import { layouts } from './002-layouts';
import type { Migration } from '@/server/models/migrate';

/** Every step of the schema, in the order in which they are applied. */
export const migrations: readonly Migration[] = [accounts, layouts];
