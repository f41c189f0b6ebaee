import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

export type Role = 'developer' | 'photographer' | 'educator' | 'admin';
export type LengthUnit = 'metres' | 'feet';

export class Account extends Model<InferAttributes<Account>, InferCreationAttributes<Account>> {
  declare id: CreationOptional<string>;
  declare email: string;
  declare name: string;
  declare passwordHash: CreationOptional<string | null>;
  declare roles: CreationOptional<Role[]>;
  declare planId: CreationOptional<string>;
  declare verifiedAt: CreationOptional<Date | null>;
  declare blockedAt: CreationOptional<Date | null>;
  declare closedAt: CreationOptional<Date | null>;
  declare ownUnitsPerMonth: CreationOptional<string | null>;
  declare ownRatePerSecond: CreationOptional<number | null>;
  declare lengthUnit: CreationOptional<LengthUnit>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

/** The model on one connection pool; a class of its own, since a process may hold several pools. */
export function accountModel(sequelize: Sequelize): typeof Account {
  class OnThisPool extends Account {}
  return OnThisPool.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      email: DataTypes.TEXT,
      name: DataTypes.TEXT,
      passwordHash: DataTypes.TEXT,
      roles: DataTypes.ARRAY(DataTypes.TEXT),
      planId: DataTypes.TEXT,
      verifiedAt: DataTypes.DATE,
      blockedAt: DataTypes.DATE,
      closedAt: DataTypes.DATE,
      ownUnitsPerMonth: DataTypes.BIGINT,
      ownRatePerSecond: DataTypes.INTEGER,
      lengthUnit: DataTypes.TEXT,
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    // The database keeps the times: its clock is the one that counts.
    { sequelize, tableName: 'accounts', underscored: true, timestamps: false },
  );
}
