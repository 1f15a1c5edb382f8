import { DataTypes, type InferAttributes, type InferCreationAttributes, type Model, type Sequelize } from 'sequelize';

/** A word by which a published board is found, in small letters without accents. */
export interface LayoutWord extends Model<InferAttributes<LayoutWord>, InferCreationAttributes<LayoutWord>> {
  word: string;
  layoutId: string;
}

export const defineLayoutWord = (sequelize: Sequelize) =>
  sequelize.define<LayoutWord>(
    'LayoutWord',
    {
      word: { type: DataTypes.STRING(60), primaryKey: true },
      layoutId: { type: DataTypes.UUID, primaryKey: true },
    },
    { tableName: 'layout_words', underscored: true, timestamps: false },
  );

/** A chip family that at least one socket of a published board takes. */
export interface LayoutFamily extends Model<InferAttributes<LayoutFamily>, InferCreationAttributes<LayoutFamily>> {
  family: string;
  layoutId: string;
}

export const defineLayoutFamily = (sequelize: Sequelize) =>
  sequelize.define<LayoutFamily>(
    'LayoutFamily',
    {
      family: { type: DataTypes.STRING(64), primaryKey: true },
      layoutId: { type: DataTypes.UUID, primaryKey: true },
    },
    { tableName: 'layout_families', underscored: true, timestamps: false },
  );
