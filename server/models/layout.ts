import {
  DataTypes,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Model,
  type Sequelize,
} from 'sequelize';
import type { LayoutDocument } from '@/shared';

/**
 * A board revision. What the library shows of it is that of the published version, or of the first one sent while
 * none is published.
 */
export interface Layout extends Model<InferAttributes<Layout>, InferCreationAttributes<Layout>> {
  id: CreationOptional<string>;
  /** Its address; never changed. */
  slug: string;
  /** SHA-256 of maker, name and revision without regard to case and accents: one board each. */
  boardKey: string;
  sortKey: string;
  maker: string;
  name: string;
  revision: string;
  kind: LayoutDocument['board']['kind'];
  year: number | null;
  dataBits: number;
  bankCount: number;
  socketCount: number;
  families: string[];
  /** Number of the version that was sent last. */
  lastNumber: CreationOptional<number>;
  /** True while a version is published: it is in the library. */
  listed: CreationOptional<boolean>;
  publishedVersionId: CreationOptional<string | null>;
  publishedNumber: CreationOptional<number | null>;
  publishedAt: CreationOptional<Date | null>;
  createdAt: CreationOptional<Date>;
  updatedAt: CreationOptional<Date>;
}

export const defineLayout = (sequelize: Sequelize) =>
  sequelize.define<Layout>(
    'Layout',
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      slug: DataTypes.STRING(100),
      boardKey: DataTypes.CHAR(64),
      sortKey: DataTypes.STRING(400),
      maker: DataTypes.STRING(60),
      name: DataTypes.STRING(60),
      revision: DataTypes.STRING(30),
      kind: DataTypes.STRING(24),
      year: DataTypes.SMALLINT.UNSIGNED,
      dataBits: DataTypes.SMALLINT.UNSIGNED,
      bankCount: DataTypes.SMALLINT.UNSIGNED,
      socketCount: DataTypes.SMALLINT.UNSIGNED,
      families: DataTypes.JSON,
      lastNumber: { type: DataTypes.INTEGER.UNSIGNED, defaultValue: 0 },
      listed: { type: DataTypes.BOOLEAN, defaultValue: false },
      publishedVersionId: DataTypes.UUID,
      publishedNumber: DataTypes.INTEGER.UNSIGNED,
      publishedAt: DataTypes.DATE(3),
      createdAt: DataTypes.DATE(3),
      updatedAt: DataTypes.DATE(3),
    },
    { tableName: 'layouts', underscored: true },
  );
