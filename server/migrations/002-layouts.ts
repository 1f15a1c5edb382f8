import type { Migration } from '@/server/models/migrate';

const uuid = 'CHAR(36) CHARACTER SET latin1 COLLATE latin1_bin';
const sha256 = 'CHAR(64) CHARACTER SET latin1 COLLATE latin1_bin';
const slug = 'VARCHAR(100) CHARACTER SET latin1 COLLATE latin1_bin';
const exact = 'CHARACTER SET utf8mb4 COLLATE utf8mb4_bin';
const table = 'ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci';

const tables = [
  `CREATE TABLE layouts (
    id ${uuid} NOT NULL PRIMARY KEY,
    slug ${slug} NOT NULL,
    board_key ${sha256} NOT NULL,
    sort_key VARCHAR(400) ${exact} NOT NULL,
    maker VARCHAR(60) NOT NULL,
    name VARCHAR(60) NOT NULL,
    revision VARCHAR(30) NOT NULL,
    kind VARCHAR(24) NOT NULL,
    year SMALLINT UNSIGNED NULL,
    data_bits SMALLINT UNSIGNED NOT NULL,
    bank_count SMALLINT UNSIGNED NOT NULL,
    socket_count SMALLINT UNSIGNED NOT NULL,
    families JSON NOT NULL,
    last_number INT UNSIGNED NOT NULL DEFAULT 0,
    listed BOOLEAN NOT NULL DEFAULT FALSE,
    published_version_id ${uuid} NULL,
    published_number INT UNSIGNED NULL,
    published_at DATETIME(3) NULL,
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    UNIQUE KEY layouts_slug (slug),
    UNIQUE KEY layouts_board (board_key),
    KEY layouts_listed (listed, sort_key, slug),
    KEY layouts_by_maker (listed, maker, sort_key, slug),
    KEY layouts_by_kind (listed, kind, sort_key, slug),
    KEY layouts_by_bits (listed, data_bits, sort_key, slug)
  ) ${table}`,
  `CREATE TABLE layout_versions (
    id ${uuid} NOT NULL PRIMARY KEY,
    layout_id ${uuid} NOT NULL,
    number INT UNSIGNED NOT NULL,
    state VARCHAR(12) NOT NULL,
    author_id ${uuid} NULL,
    moderator_id ${uuid} NULL,
    remarks VARCHAR(2000) NULL,
    document MEDIUMTEXT ${exact} NOT NULL,
    checksum ${sha256} NOT NULL,
    problem_count SMALLINT UNSIGNED NOT NULL,
    \`change\` INT UNSIGNED NOT NULL DEFAULT 1,
    submitted_at DATETIME(3) NULL,
    decided_at DATETIME(3) NULL,
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    UNIQUE KEY layout_versions_number (layout_id, number),
    KEY layout_versions_queue (state, submitted_at, id),
    KEY layout_versions_by_author (author_id, updated_at, id),
    KEY layout_versions_by_author_state (author_id, state, updated_at, id),
    CONSTRAINT layout_versions_layout FOREIGN KEY (layout_id) REFERENCES layouts (id),
    CONSTRAINT layout_versions_author FOREIGN KEY (author_id) REFERENCES users (id) ON DELETE SET NULL,
    CONSTRAINT layout_versions_moderator FOREIGN KEY (moderator_id) REFERENCES users (id) ON DELETE SET NULL
  ) ${table}`,
  `CREATE TABLE layout_words (
    word VARCHAR(60) ${exact} NOT NULL,
    layout_id ${uuid} NOT NULL,
    PRIMARY KEY (word, layout_id),
    KEY layout_words_by_layout (layout_id),
    CONSTRAINT layout_words_layout FOREIGN KEY (layout_id) REFERENCES layouts (id) ON DELETE CASCADE
  ) ${table}`,
  `CREATE TABLE layout_families (
    family VARCHAR(64) ${exact} NOT NULL,
    layout_id ${uuid} NOT NULL,
    PRIMARY KEY (family, layout_id),
    KEY layout_families_by_layout (layout_id),
    CONSTRAINT layout_families_layout FOREIGN KEY (layout_id) REFERENCES layouts (id) ON DELETE CASCADE
  ) ${table}`,
];

/** Boards, the versions of their layouts, and what the library searches. */
export const layouts: Migration = {
  name: '002-layouts',
  up: async (query) => {
    for (const sql of tables) await query.sequelize.query(sql);
  },
  down: async (query) => {
    for (const name of ['layout_families', 'layout_words', 'layout_versions', 'layouts']) await query.dropTable(name);
  },
};
