import {
  DataTypes,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Model,
  type Sequelize,
} from 'sequelize';

/** One sign-in on one device: the family of all refresh tokens that followed from it. */
export interface Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  id: CreationOptional<string>;
  userId: string;
  expiresAt: Date;
  endedAt: Date | null;
  /** Why it ended: signed-out, password-changed, token-reused. */
  endedBy: string | null;
  createdAt: CreationOptional<Date>;
}

export const defineSession = (sequelize: Sequelize) =>
  sequelize.define<Session>(
    'Session',
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      userId: DataTypes.UUID,
      expiresAt: DataTypes.DATE(3),
      endedAt: DataTypes.DATE(3),
      endedBy: DataTypes.STRING(24),
      createdAt: DataTypes.DATE(3),
    },
    { tableName: 'sessions', underscored: true, updatedAt: false },
  );

/** One refresh token of a session, kept as its SHA-256. A token that comes a second time was stolen. */
export interface RefreshToken extends Model<InferAttributes<RefreshToken>, InferCreationAttributes<RefreshToken>> {
  tokenHash: string;
  sessionId: string;
  usedAt: Date | null;
  createdAt: CreationOptional<Date>;
}

export const defineRefreshToken = (sequelize: Sequelize) =>
  sequelize.define<RefreshToken>(
    'RefreshToken',
    {
      tokenHash: { type: DataTypes.CHAR(64), primaryKey: true },
      sessionId: DataTypes.UUID,
      usedAt: DataTypes.DATE(3),
      createdAt: DataTypes.DATE(3),
    },
    { tableName: 'refresh_tokens', underscored: true, updatedAt: false },
  );
