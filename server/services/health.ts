import { QueryTypes } from 'sequelize';
import type { Context } from '@/server/context';
import { AppError } from '@/server/errors';

/** Throws `not-ready` unless the database answers. */
export const checkReady = async ({ db, logger }: Context): Promise<void> => {
  try {
    await db.sequelize.query('SELECT 1', { type: QueryTypes.SELECT });
  } catch (error) {
    logger.warn({ err: error }, 'the database does not answer');
    throw new AppError('not-ready');
  }
};
