import type { Migration } from '@/server/models/migrate';

const uuid = 'CHAR(36) CHARACTER SET latin1 COLLATE latin1_bin';
const sha256 = 'CHAR(64) CHARACTER SET latin1 COLLATE latin1_bin';
const table = 'ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci';

const tables = [
  `CREATE TABLE users (
    id ${uuid} NOT NULL PRIMARY KEY,
    email VARCHAR(254) NOT NULL,
    email_key VARCHAR(254) COLLATE utf8mb4_bin NOT NULL,
    name VARCHAR(80) NOT NULL,
    password_hash CHAR(60) CHARACTER SET latin1 COLLATE latin1_bin NOT NULL,
    role VARCHAR(16) NOT NULL,
    email_confirmed_at DATETIME(3) NULL,
    version INT UNSIGNED NOT NULL DEFAULT 1,
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    UNIQUE KEY users_email_key (email_key),
    KEY users_by_name (name, id),
    KEY users_by_role (role, name, id)
  ) ${table}`,
  `CREATE TABLE sessions (
    id ${uuid} NOT NULL PRIMARY KEY,
    user_id ${uuid} NOT NULL,
    expires_at DATETIME(3) NOT NULL,
    ended_at DATETIME(3) NULL,
    ended_by VARCHAR(24) NULL,
    created_at DATETIME(3) NOT NULL,
    KEY sessions_by_user (user_id, ended_at),
    KEY sessions_by_end (expires_at),
    CONSTRAINT sessions_user FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE
  ) ${table}`,
  `CREATE TABLE refresh_tokens (
    token_hash ${sha256} NOT NULL PRIMARY KEY,
    session_id ${uuid} NOT NULL,
    used_at DATETIME(3) NULL,
    created_at DATETIME(3) NOT NULL,
    KEY refresh_tokens_by_session (session_id, created_at),
    CONSTRAINT refresh_tokens_session FOREIGN KEY (session_id) REFERENCES sessions (id) ON DELETE CASCADE
  ) ${table}`,
  `CREATE TABLE email_tokens (
    token_hash ${sha256} NOT NULL PRIMARY KEY,
    user_id ${uuid} NOT NULL,
    purpose VARCHAR(16) NOT NULL,
    expires_at DATETIME(3) NOT NULL,
    used_at DATETIME(3) NULL,
    created_at DATETIME(3) NOT NULL,
    KEY email_tokens_by_user (user_id, purpose),
    KEY email_tokens_by_end (expires_at),
    CONSTRAINT email_tokens_user FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE
  ) ${table}`,
  `CREATE TABLE outbox_mails (
    id ${uuid} NOT NULL PRIMARY KEY,
    recipient VARCHAR(254) NOT NULL,
    subject VARCHAR(200) NOT NULL,
    body TEXT NULL,
    state VARCHAR(8) NOT NULL,
    attempts INT UNSIGNED NOT NULL DEFAULT 0,
    due_at DATETIME(3) NOT NULL,
    last_error VARCHAR(300) NULL,
    sent_at DATETIME(3) NULL,
    created_at DATETIME(3) NOT NULL,
    KEY outbox_mails_due (state, due_at)
  ) ${table}`,
  `CREATE TABLE role_requests (
    id ${uuid} NOT NULL PRIMARY KEY,
    user_id ${uuid} NOT NULL,
    open_for ${uuid} NULL,
    reason VARCHAR(1000) NOT NULL,
    state VARCHAR(8) NOT NULL,
    decided_by ${uuid} NULL,
    decided_at DATETIME(3) NULL,
    created_at DATETIME(3) NOT NULL,
    UNIQUE KEY role_requests_open_for (open_for),
    KEY role_requests_by_state (state, created_at, id),
    KEY role_requests_by_user (user_id, created_at),
    CONSTRAINT role_requests_user FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE
  ) ${table}`,
  `CREATE TABLE audit_entries (
    id ${uuid} NOT NULL PRIMARY KEY,
    actor_id ${uuid} NULL,
    act VARCHAR(40) NOT NULL,
    subject_kind VARCHAR(24) NOT NULL,
    subject_id VARCHAR(64) NOT NULL,
    detail JSON NOT NULL,
    created_at DATETIME(3) NOT NULL,
    KEY audit_entries_by_time (created_at, id),
    KEY audit_entries_by_subject (subject_kind, subject_id, created_at)
  ) ${table}`,
  `CREATE TABLE attempts (
    id VARCHAR(160) CHARACTER SET latin1 COLLATE latin1_bin NOT NULL PRIMARY KEY,
    points INT UNSIGNED NOT NULL,
    ends_at DATETIME(3) NOT NULL,
    KEY attempts_by_end (ends_at)
  ) ${table}`,
  `CREATE TABLE seedings (
    name VARCHAR(32) NOT NULL PRIMARY KEY,
    created_at DATETIME(3) NOT NULL
  ) ${table}`,
];

/** People, their sessions, the links and the mail they are sent, their requests, and the trail of acts. */
export const accounts: Migration = {
  name: '001-accounts',
  up: async (query) => {
    for (const sql of tables) await query.sequelize.query(sql);
  },
  down: async (query) => {
    const names = [
      'seedings',
      'attempts',
      'audit_entries',
      'role_requests',
      'outbox_mails',
      'email_tokens',
      'refresh_tokens',
      'sessions',
      'users',
    ];
    for (const name of names) await query.dropTable(name);
  },
};
