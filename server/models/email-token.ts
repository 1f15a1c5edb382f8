import {
  DataTypes,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Model,
  type Sequelize,
} from 'sequelize';

/** A link sent by mail, kept as the SHA-256 of its token: good once, until it expires. */
export interface EmailToken extends Model<InferAttributes<EmailToken>, InferCreationAttributes<EmailToken>> {
  tokenHash: string;
  userId: string;
  purpose: 'confirm' | 'reset';
  expiresAt: Date;
  usedAt: Date | null;
  createdAt: CreationOptional<Date>;
}

export const defineEmailToken = (sequelize: Sequelize) =>
  sequelize.define<EmailToken>(
    'EmailToken',
    {
      tokenHash: { type: DataTypes.CHAR(64), primaryKey: true },
      userId: DataTypes.UUID,
      purpose: DataTypes.STRING(16),
      expiresAt: DataTypes.DATE(3),
      usedAt: DataTypes.DATE(3),
      createdAt: DataTypes.DATE(3),
    },
    { tableName: 'email_tokens', underscored: true, updatedAt: false },
  );
