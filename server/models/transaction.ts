import type { Sequelize, Transaction } from 'sequelize';

/** Deadlock, lock wait timeout, and a Galera node that is not ready to serve: the same work may succeed at once. */
const passing = new Set([1213, 1205, 1047]);

const mostTries = 5;

const isPassing = (error: unknown): boolean => {
  const { original } = (error ?? {}) as { original?: { errno?: number } };
  return original?.errno !== undefined && passing.has(original.errno);
};

/**
 * Runs `work` in a transaction and runs it again when the database gave way (deadlock, certification failure),
 * at most five times. `work` must do nothing outside the transaction.
 */
export const inTransaction = async <T>(
  { sequelize }: { sequelize: Sequelize },
  work: (transaction: Transaction) => Promise<T>,
): Promise<T> => {
  for (let tries = 1; ; tries++) {
    try {
      return await sequelize.transaction(work);
    } catch (error) {
      if (tries >= mostTries || !isPassing(error)) throw error;
      await new Promise((resolve) => setTimeout(resolve, 10 * 2 ** tries * (0.5 + Math.random())));
    }
  }
};
