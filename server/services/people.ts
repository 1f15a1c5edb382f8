import { Op, type WhereOptions } from 'sequelize';
import { z } from 'zod';
import { recordAct } from './audit';
import { readCursor, toPage } from './cursor';
import type { Context } from '@/server/context';
import { AppError } from '@/server/errors';
import { inTransaction } from '@/server/models/transaction';
import type { User } from '@/server/models/user';
import { mayChangeRole } from '@/server/policies/roles';
import { requirePerson } from '@/server/policies/standing';
import type { PeopleQuery } from '@/shared/api/people';
import type { Role } from '@/shared/roles';

const cursorValues = z.tuple([z.string(), z.uuid()]);

/** Text for LIKE in which % and _ stand for themselves. */
const literally = (text: string): string => text.replace(/[\\%_]/g, (sign) => `\\${sign}`);

/** People by name, filtered by role and by part of the name or the address. */
export const listPeople = async (
  { db }: Context,
  { limit, cursor, search, role }: PeopleQuery,
): Promise<{ rows: readonly User[]; nextCursor: string | null }> => {
  const conditions: WhereOptions[] = [];
  if (role) conditions.push({ role });
  if (search) {
    const like = { [Op.like]: `%${literally(search)}%` };
    conditions.push({ [Op.or]: [{ name: like }, { email: like }] });
  }
  if (cursor !== undefined) {
    const [name, id] = readCursor(cursor, cursorValues);
    conditions.push({ [Op.or]: [{ name: { [Op.gt]: name } }, { name, id: { [Op.gt]: id } }] });
  }
  const order: [string, string][] = [
    ['name', 'ASC'],
    ['id', 'ASC'],
  ];
  const rows = await db.User.findAll({ where: { [Op.and]: conditions }, order, limit: limit + 1 });
  return toPage(rows, limit, (user) => [user.name, user.id]);
};

/**
 * Gives a person another role and writes it into the audit trail. Throws `not-found`, `role-required`, and
 * `version-conflict` when the person was changed since `version`.
 */
export const changeRole = (context: Context, change: { id: string; role: Role; version: number }): Promise<User> =>
  inTransaction(context.db, async (transaction) => {
    const by = requirePerson(context);
    const user = await context.db.User.findByPk(change.id, { lock: true, transaction });
    if (!user) throw new AppError('not-found');
    mayChangeRole({ by: { id: by.userId, role: by.standing }, of: user, to: change.role });
    if (user.version !== change.version) throw new AppError('version-conflict');
    const from = user.role;
    await user.update({ role: change.role, version: user.version + 1 }, { transaction });
    const act = { act: 'role-changed', subject: { kind: 'user', id: user.id }, detail: { from, to: change.role } };
    await recordAct(context, act, transaction);
    return user;
  });
