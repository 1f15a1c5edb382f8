import {
  DataTypes,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Model,
  type Sequelize,
} from 'sequelize';

/**
 * A mail to be sent, written in the transaction of what it tells about. The worker takes it with a lease, sends
 * it and then empties the body, because a link in it is a secret.
 */
export interface OutboxMail extends Model<InferAttributes<OutboxMail>, InferCreationAttributes<OutboxMail>> {
  id: CreationOptional<string>;
  recipient: string;
  subject: string;
  body: string | null;
  state: CreationOptional<'waiting' | 'sent' | 'failed'>;
  attempts: CreationOptional<number>;
  /** Not before this moment (UTC): the next attempt, or the end of a worker's lease. */
  dueAt: Date;
  lastError: string | null;
  sentAt: Date | null;
  createdAt: CreationOptional<Date>;
}

export const defineOutboxMail = (sequelize: Sequelize) =>
  sequelize.define<OutboxMail>(
    'OutboxMail',
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      recipient: DataTypes.STRING(254),
      subject: DataTypes.STRING(200),
      body: DataTypes.TEXT,
      state: { type: DataTypes.STRING(8), defaultValue: 'waiting' },
      attempts: { type: DataTypes.INTEGER.UNSIGNED, defaultValue: 0 },
      dueAt: DataTypes.DATE(3),
      lastError: DataTypes.STRING(300),
      sentAt: DataTypes.DATE(3),
      createdAt: DataTypes.DATE(3),
    },
    { tableName: 'outbox_mails', underscored: true, updatedAt: false },
  );
