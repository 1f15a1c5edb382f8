import {
  DataTypes,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Model,
  type Sequelize,
} from 'sequelize';

/** One act of somebody with power over others' work; never changed and never deleted. */
export interface AuditEntry extends Model<InferAttributes<AuditEntry>, InferCreationAttributes<AuditEntry>> {
  id: CreationOptional<string>;
  actorId: string | null;
  /** What was done, such as role-changed. */
  act: string;
  /** Kind and id of what it was done to, such as user and its id. */
  subjectKind: string;
  subjectId: string;
  detail: Record<string, unknown>;
  createdAt: CreationOptional<Date>;
}

export const defineAuditEntry = (sequelize: Sequelize) =>
  sequelize.define<AuditEntry>(
    'AuditEntry',
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      actorId: DataTypes.UUID,
      act: DataTypes.STRING(40),
      subjectKind: DataTypes.STRING(24),
      subjectId: DataTypes.STRING(64),
      detail: DataTypes.JSON,
      createdAt: DataTypes.DATE(3),
    },
    { tableName: 'audit_entries', underscored: true, updatedAt: false },
  );
