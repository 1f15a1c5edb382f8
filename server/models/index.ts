import { Sequelize, type Transaction } from 'sequelize';
import { defineAuditEntry } from './audit-entry';
import { defineEmailToken } from './email-token';
import { defineLayout } from './layout';
import { defineLayoutFamily, defineLayoutWord } from './layout-search';
import { defineLayoutVersion } from './layout-version';
import { defineOutboxMail } from './outbox-mail';
import { defineRoleRequest } from './role-request';
import { defineSeeding } from './seeding';
import { defineRefreshToken, defineSession } from './session';
import { defineUser } from './user';

/** The connection and every model on it. */
export type Database = ReturnType<typeof openDatabase>;

/** Opens a pool on a MariaDB; nothing is sent until the first query. All times are UTC. */
export const openDatabase = ({ url, pool }: { url: string; pool: number }) => {
  const sequelize = new Sequelize(url, {
    dialect: 'mariadb',
    timezone: '+00:00',
    logging: false,
    isolationLevel: 'READ COMMITTED' as Transaction.ISOLATION_LEVELS,
    pool: { max: pool, min: 0, idle: 30_000, acquire: 10_000 },
    define: { charset: 'utf8mb4' },
  });
  return {
    sequelize,
    AuditEntry: defineAuditEntry(sequelize),
    EmailToken: defineEmailToken(sequelize),
    Layout: defineLayout(sequelize),
    LayoutFamily: defineLayoutFamily(sequelize),
    LayoutVersion: defineLayoutVersion(sequelize),
    LayoutWord: defineLayoutWord(sequelize),
    OutboxMail: defineOutboxMail(sequelize),
    RefreshToken: defineRefreshToken(sequelize),
    RoleRequest: defineRoleRequest(sequelize),
    Seeding: defineSeeding(sequelize),
    Session: defineSession(sequelize),
    User: defineUser(sequelize),
  };
};
