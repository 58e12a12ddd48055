import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { CreationOptional, Sequelize } from 'sequelize';

/** Something slow or outside to be done, written in the transaction of its cause. */
export class Outbox extends Model<InferAttributes<Outbox>, InferCreationAttributes<Outbox>> {
  declare id: string;
  declare kind: string;
  declare onceKey: string | null;
  declare caseId: string | null;
  /** JSON text. */
  declare payload: string;
  declare createdAt: Date;
  declare dueAt: Date;
  declare claimedUntil: CreationOptional<Date | null>;
  declare attempts: CreationOptional<number>;
  declare doneAt: CreationOptional<Date | null>;
  declare failedAt: CreationOptional<Date | null>;
  /** A code, never personal data. */
  declare lastError: CreationOptional<string | null>;

  static register(sequelize: Sequelize): void {
    Outbox.init(
      {
        id: { type: DataTypes.UUID, primaryKey: true },
        kind: { type: DataTypes.STRING(30), allowNull: false },
        onceKey: { type: DataTypes.STRING(120), allowNull: true },
        caseId: { type: DataTypes.UUID, allowNull: true },
        payload: { type: DataTypes.TEXT('medium'), allowNull: false },
        createdAt: { type: DataTypes.DATE(3), allowNull: false },
        dueAt: { type: DataTypes.DATE(3), allowNull: false },
        claimedUntil: { type: DataTypes.DATE(3), allowNull: true },
        attempts: { type: DataTypes.SMALLINT.UNSIGNED, allowNull: false, defaultValue: 0 },
        doneAt: { type: DataTypes.DATE(3), allowNull: true },
        failedAt: { type: DataTypes.DATE(3), allowNull: true },
        lastError: { type: DataTypes.STRING(240), allowNull: true },
      },
      { sequelize, tableName: 'outbox' },
    );
  }
}
