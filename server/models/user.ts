import {
  DataTypes,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Model,
  type Sequelize,
} from 'sequelize';
import type { Role } from '@/shared/roles';

/** A person with an account. `emailKey` is the address in lower case: one account an address. */
export interface User extends Model<InferAttributes<User>, InferCreationAttributes<User>> {
  id: CreationOptional<string>;
  email: string;
  emailKey: string;
  name: string;
  passwordHash: string;
  role: CreationOptional<Role>;
  /** UTC; null until the link in the mail was followed. */
  emailConfirmedAt: Date | null;
  /** Grows with each change of the person by others, for If-Match. */
  version: CreationOptional<number>;
  createdAt: CreationOptional<Date>;
  updatedAt: CreationOptional<Date>;
}

export const defineUser = (sequelize: Sequelize) =>
  sequelize.define<User>(
    'User',
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      email: DataTypes.STRING(254),
      emailKey: DataTypes.STRING(254),
      name: DataTypes.STRING(80),
      passwordHash: DataTypes.CHAR(60),
      role: { type: DataTypes.STRING(16), defaultValue: 'technician' },
      emailConfirmedAt: DataTypes.DATE(3),
      version: { type: DataTypes.INTEGER.UNSIGNED, defaultValue: 1 },
      createdAt: DataTypes.DATE(3),
      updatedAt: DataTypes.DATE(3),
    },
    { tableName: 'users', underscored: true },
  );
