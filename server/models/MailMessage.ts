import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** A mail that waits in the outbox, or the note that it was sent or given up. */
export class MailMessage extends Model<InferAttributes<MailMessage>, InferCreationAttributes<MailMessage>> {
  declare id: CreationOptional<string>;
  declare accountId: string | null;
  declare recipient: string;
  declare kind: string;
  /** What its words need to know, encrypted; null once it was sent or given up. */
  declare sealed: Buffer | null;
  declare attempts: CreationOptional<number>;
  declare lastError: CreationOptional<string | null>;
  declare expiresAt: Date;
  declare sentAt: CreationOptional<Date | null>;
  declare failedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
}

/** The model on one connection pool. */
export function mailMessageModel(sequelize: Sequelize): typeof MailMessage {
  class OnThisPool extends MailMessage {}
  return OnThisPool.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      accountId: DataTypes.UUID,
      recipient: DataTypes.TEXT,
      kind: DataTypes.TEXT,
      sealed: DataTypes.BLOB,
      attempts: DataTypes.INTEGER,
      lastError: DataTypes.TEXT,
      expiresAt: DataTypes.DATE,
      sentAt: DataTypes.DATE,
      failedAt: DataTypes.DATE,
      createdAt: DataTypes.DATE,
    },
    { sequelize, tableName: 'mail_outbox', underscored: true, timestamps: false },
  );
}
