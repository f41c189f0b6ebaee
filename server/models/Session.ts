import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

export type EndReason =
  'signed_out' | 'ended' | 'replaced' | 'password' | 'reuse' | 'expired' | 'closed' | 'blocked';

export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  declare id: CreationOptional<string>;
  declare accountId: string;
  declare agent: string;
  declare address: string;
  /** What throttles take for one place: the address itself, or the /56 of an IPv6 address. */
  declare addressGroup: string;
  declare lastSeenAt: CreationOptional<Date>;
  declare expiresAt: Date;
  declare endedAt: CreationOptional<Date | null>;
  declare endReason: CreationOptional<EndReason | null>;
  declare createdAt: CreationOptional<Date>;
}

/** The model on one connection pool. */
export function sessionModel(sequelize: Sequelize): typeof Session {
  class OnThisPool extends Session {}
  return OnThisPool.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      accountId: DataTypes.UUID,
      agent: DataTypes.TEXT,
      address: DataTypes.TEXT,
      addressGroup: DataTypes.TEXT,
      lastSeenAt: DataTypes.DATE,
      expiresAt: DataTypes.DATE,
      endedAt: DataTypes.DATE,
      endReason: DataTypes.TEXT,
      createdAt: DataTypes.DATE,
    },
    { sequelize, tableName: 'sessions', underscored: true, timestamps: false },
  );
}
