import { Op, UniqueConstraintError } from 'sequelize';
import { z } from 'zod';
import { recordAct } from './audit';
import { readCursor, toPage } from './cursor';
import { queueMail } from './outbox';
import type { Context } from '@/server/context';
import { AppError } from '@/server/errors';
import { roleDecisionMail } from '@/server/mail/messages';
import type { RoleRequest } from '@/server/models/role-request';
import { inTransaction } from '@/server/models/transaction';
import type { User } from '@/server/models/user';
import { mayChangeRole } from '@/server/policies/roles';
import { requirePerson } from '@/server/policies/standing';
import type { RoleRequestInput, RoleRequestQuery } from '@/shared/api/people';
import { includesRole } from '@/shared/roles';

/** A request and whose it is. */
export interface RequestOf {
  readonly request: RoleRequest;
  readonly person: User;
}

const cursorValues = z.tuple([z.iso.datetime(), z.uuid()]);

/** Asks for the role of contributor; throws `request-open`, or `conflict` for somebody who has the role. */
export const askForRole = async (context: Context, { reason }: RoleRequestInput): Promise<RequestOf> => {
  const { userId, standing } = requirePerson(context);
  if (includesRole(standing, 'contributor'))
    throw new AppError('conflict', { message: 'You are a contributor already.' });
  const person = await context.db.User.findByPk(userId);
  if (!person) throw new AppError('session-ended');
  try {
    const asked = { userId, openFor: userId, reason, decidedBy: null, decidedAt: null };
    return { request: await context.db.RoleRequest.create(asked), person };
  } catch (error) {
    if (error instanceof UniqueConstraintError) throw new AppError('request-open');
    throw error;
  }
};

/** The latest request of whoever asks. */
export const loadOwnRequest = async (context: Context): Promise<RequestOf | undefined> => {
  const { userId } = requirePerson(context);
  const person = await context.db.User.findByPk(userId);
  const request = await context.db.RoleRequest.findOne({ where: { userId }, order: [['createdAt', 'DESC']] });
  return person && request ? { request, person } : undefined;
};

/** Requests of one state, the oldest first. */
export const listRoleRequests = async (
  { db }: Context,
  { limit, cursor, state }: RoleRequestQuery,
): Promise<{ rows: readonly RequestOf[]; nextCursor: string | null }> => {
  const where = { state, ...(cursor === undefined ? {} : after(cursor)) };
  const order: [string, string][] = [
    ['createdAt', 'ASC'],
    ['id', 'ASC'],
  ];
  const requests = await db.RoleRequest.findAll({ where, order, limit: limit + 1 });
  const { rows, nextCursor } = toPage(requests, limit, (row) => [row.createdAt.toISOString(), row.id]);
  const people = await db.User.findAll({ where: { id: rows.map((row) => row.userId) } });
  const byId = new Map(people.map((person) => [person.id, person]));
  const withPerson = rows.flatMap((request) => {
    const person = byId.get(request.userId);
    return person ? [{ request, person }] : [];
  });
  return { rows: withPerson, nextCursor };
};

const after = (cursor: string) => {
  const [at, id] = readCursor(cursor, cursorValues);
  const createdAt = new Date(at);
  return { [Op.or]: [{ createdAt: { [Op.gt]: createdAt } }, { createdAt, id: { [Op.gt]: id } }] };
};

/** Grants or declines an open request, tells its person by mail and writes it into the audit trail. */
export const decideRoleRequest = (
  context: Context,
  { id, decision }: { id: string; decision: 'granted' | 'declined' },
): Promise<RequestOf> =>
  inTransaction(context.db, async (transaction) => {
    const { db, config, now } = context;
    const by = requirePerson(context);
    const request = await db.RoleRequest.findByPk(id, { lock: true, transaction });
    const person = request && (await db.User.findByPk(request.userId, { lock: true, transaction }));
    if (!request || !person) throw new AppError('not-found');
    if (request.state !== 'open') throw new AppError('conflict', { message: 'This request has been answered.' });
    const granted = decision === 'granted';
    if (granted && !includesRole(person.role, 'contributor')) {
      mayChangeRole({ by: { id: by.userId, role: by.standing }, of: person, to: 'contributor' });
      await person.update({ role: 'contributor', version: person.version + 1 }, { transaction });
    }
    await request.update({ state: decision, openFor: null, decidedBy: by.userId, decidedAt: now() }, { transaction });
    const subject = { kind: 'user', id: person.id };
    await recordAct(context, { act: `role-request-${decision}`, subject, detail: { request: id } }, transaction);
    await queueMail(context, roleDecisionMail(config, person, { granted }), transaction);
    return { request, person };
  });
