import {
  DataTypes,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Model,
  type Sequelize,
} from 'sequelize';

/** A technician's request for the role of contributor. `openFor` is the user while it is open: one open request a user. */
export interface RoleRequest extends Model<InferAttributes<RoleRequest>, InferCreationAttributes<RoleRequest>> {
  id: CreationOptional<string>;
  userId: string;
  openFor: string | null;
  reason: string;
  state: CreationOptional<'open' | 'granted' | 'declined'>;
  decidedBy: string | null;
  decidedAt: Date | null;
  createdAt: CreationOptional<Date>;
}

export const defineRoleRequest = (sequelize: Sequelize) =>
  sequelize.define<RoleRequest>(
    'RoleRequest',
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      userId: DataTypes.UUID,
      openFor: DataTypes.UUID,
      reason: DataTypes.STRING(1000),
      state: { type: DataTypes.STRING(8), defaultValue: 'open' },
      decidedBy: DataTypes.UUID,
      decidedAt: DataTypes.DATE(3),
      createdAt: DataTypes.DATE(3),
    },
    { tableName: 'role_requests', underscored: true, updatedAt: false },
  );
