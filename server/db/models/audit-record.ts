import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { CreationOptional, Sequelize } from 'sequelize';

/** One act that must be answerable later: who did what to what, and when. */
export class AuditRecord extends Model<
  InferAttributes<AuditRecord>,
  InferCreationAttributes<AuditRecord>
> {
  declare id: string;
  declare at: Date;
  declare personId: CreationOptional<string | null>;
  declare customerId: CreationOptional<string | null>;
  declare act: string;
  declare caseId: CreationOptional<string | null>;
  declare subjectId: CreationOptional<string | null>;
  declare detail: CreationOptional<string | null>;

  static register(sequelize: Sequelize): void {
    AuditRecord.init(
      {
        id: { type: DataTypes.UUID, primaryKey: true },
        at: { type: DataTypes.DATE(3), allowNull: false },
        personId: { type: DataTypes.UUID, allowNull: true },
        customerId: { type: DataTypes.UUID, allowNull: true },
        act: { type: DataTypes.STRING(60), allowNull: false },
        caseId: { type: DataTypes.UUID, allowNull: true },
        subjectId: { type: DataTypes.UUID, allowNull: true },
        detail: { type: DataTypes.TEXT, allowNull: true },
      },
      { sequelize, tableName: 'audit_records' },
    );
  }
}
