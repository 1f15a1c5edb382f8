import {
  DataTypes,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Model,
  type Sequelize,
} from 'sequelize';
import type { LayoutDocument } from '@/shared';
import type { VersionState } from '@/shared/api/layouts';

/** One version of a board's layout document. Once it was published the document never changes. */
export interface LayoutVersion extends Model<InferAttributes<LayoutVersion>, InferCreationAttributes<LayoutVersion>> {
  id: CreationOptional<string>;
  layoutId: string;
  /** Counted from 1 within the board. */
  number: number;
  state: VersionState;
  authorId: string | null;
  /** Who decided on it last. */
  moderatorId: CreationOptional<string | null>;
  remarks: CreationOptional<string | null>;
  /** The document as JSON text, with its defaults filled in. It is kept as text so that it is sent as it is. */
  document: string;
  /** SHA-256 of `document`, hexadecimal. */
  checksum: string;
  /** Warnings that the check gave. */
  problemCount: number;
  /** Grows with each change, for If-Match. */
  change: CreationOptional<number>;
  submittedAt: Date | null;
  decidedAt: CreationOptional<Date | null>;
  createdAt: CreationOptional<Date>;
  updatedAt: CreationOptional<Date>;
}

/** The document of a version. It was checked against the schema before it was stored. */
export const readStoredDocument = ({ document }: Pick<LayoutVersion, 'document'>): LayoutDocument =>
  JSON.parse(document) as LayoutDocument;

/** States whose document is fixed for good. */
const fixed: ReadonlySet<VersionState> = new Set(['published', 'retired']);

export const defineLayoutVersion = (sequelize: Sequelize) => {
  const model = sequelize.define<LayoutVersion>(
    'LayoutVersion',
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      layoutId: DataTypes.UUID,
      number: DataTypes.INTEGER.UNSIGNED,
      state: DataTypes.STRING(12),
      authorId: DataTypes.UUID,
      moderatorId: DataTypes.UUID,
      remarks: DataTypes.STRING(2000),
      document: DataTypes.TEXT('medium'),
      checksum: DataTypes.CHAR(64),
      problemCount: DataTypes.SMALLINT.UNSIGNED,
      change: { type: DataTypes.INTEGER.UNSIGNED, defaultValue: 1 },
      submittedAt: DataTypes.DATE(3),
      decidedAt: DataTypes.DATE(3),
      createdAt: DataTypes.DATE(3),
      updatedAt: DataTypes.DATE(3),
    },
    { tableName: 'layout_versions', underscored: true },
  );
  model.addHook('beforeUpdate', 'documents of published versions are fixed', (row) => {
    const version = row as LayoutVersion;
    const before = version.previous('state') ?? version.state;
    if (fixed.has(before) && (version.changed('document') || version.changed('checksum'))) {
      throw new RangeError('The document of a published version never changes.');
    }
  });
  model.addHook('beforeBulkUpdate', 'documents are changed one by one', (options: { fields?: string[] }) => {
    if (options.fields?.some((field) => field === 'document' || field === 'checksum')) {
      throw new RangeError('Documents are changed one by one, so that published ones stay as they are.');
    }
  });
  return model;
};
