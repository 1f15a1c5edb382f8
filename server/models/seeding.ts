import {
  DataTypes,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Model,
  type Sequelize,
} from 'sequelize';

/** Notes that a set of data was filled in, so that it is done once. */
export interface Seeding extends Model<InferAttributes<Seeding>, InferCreationAttributes<Seeding>> {
  name: string;
  createdAt: CreationOptional<Date>;
}

export const defineSeeding = (sequelize: Sequelize) =>
  sequelize.define<Seeding>(
    'Seeding',
    { name: { type: DataTypes.STRING(32), primaryKey: true }, createdAt: DataTypes.DATE(3) },
    { tableName: 'seedings', underscored: true, updatedAt: false },
  );
