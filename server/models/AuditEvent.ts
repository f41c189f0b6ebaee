import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';

/** One act of consequence; rows are only ever added. */
export class AuditEvent extends Model<InferAttributes<AuditEvent>, InferCreationAttributes<AuditEvent>> {
  /** A 64-bit number, which the database driver hands over as text. */
  declare id: CreationOptional<string>;
  declare at: CreationOptional<Date>;
  declare event: string;
  /** Who did it; null where nobody was signed in. */
  declare actorId: string | null;
  /** Whose account it concerns; null where no account was meant. */
  declare accountId: string | null;
  declare subjectKind: string | null;
  declare subjectId: string | null;
  declare details: Record<string, unknown>;
  declare address: string | null;
  declare agent: string | null;
  declare requestId: string | null;
}

/** The model on one connection pool. */
export function auditEventModel(sequelize: Sequelize): typeof AuditEvent {
  class OnThisPool extends AuditEvent {}
  return OnThisPool.init(
    {
      id: { type: DataTypes.BIGINT, primaryKey: true, autoIncrement: true },
      at: DataTypes.DATE,
      event: DataTypes.TEXT,
      actorId: DataTypes.UUID,
      accountId: DataTypes.UUID,
      subjectKind: DataTypes.TEXT,
      subjectId: DataTypes.TEXT,
      details: DataTypes.JSONB,
      address: DataTypes.TEXT,
      agent: DataTypes.TEXT,
      requestId: DataTypes.TEXT,
    },
    { sequelize, tableName: 'audit_events', underscored: true, timestamps: false },
  );
}
