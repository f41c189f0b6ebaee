import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

export class ApiKey extends Model<InferAttributes<ApiKey>, InferCreationAttributes<ApiKey>> {
  declare id: CreationOptional<string>;
  declare accountId: string;
  declare kind: 'server' | 'page';
  declare name: string;
  /** SHA-256 of the key; null until its owner generated it. */
  declare hash: CreationOptional<Buffer | null>;
  declare shownPrefix: CreationOptional<string | null>;
  declare lastFour: CreationOptional<string | null>;
  declare scopes: string[];
  declare allowedSites: CreationOptional<string[]>;
  declare monthlyCap: CreationOptional<string | null>;
  declare expiresAt: CreationOptional<Date | null>;
  declare claimedAt: CreationOptional<Date | null>;
  declare revokedAt: CreationOptional<Date | null>;
  declare replacedBy: CreationOptional<string | null>;
  declare askedAs: CreationOptional<string | null>;
  declare askedHash: CreationOptional<Buffer | null>;
  declare createdAt: CreationOptional<Date>;
}

/** The model on one connection pool. */
export function apiKeyModel(sequelize: Sequelize): typeof ApiKey {
  class OnThisPool extends ApiKey {}
  return OnThisPool.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      accountId: DataTypes.UUID,
      kind: DataTypes.TEXT,
      name: DataTypes.TEXT,
      hash: DataTypes.BLOB,
      shownPrefix: DataTypes.TEXT,
      lastFour: DataTypes.TEXT,
      scopes: DataTypes.ARRAY(DataTypes.TEXT),
      allowedSites: DataTypes.ARRAY(DataTypes.TEXT),
      monthlyCap: DataTypes.BIGINT,
      expiresAt: DataTypes.DATE,
      claimedAt: DataTypes.DATE,
      revokedAt: DataTypes.DATE,
      replacedBy: DataTypes.UUID,
      askedAs: DataTypes.TEXT,
      askedHash: DataTypes.BLOB,
      createdAt: DataTypes.DATE,
    },
    { sequelize, tableName: 'api_keys', underscored: true, timestamps: false },
  );
}
