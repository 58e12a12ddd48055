import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { CreationOptional, Sequelize } from 'sequelize';

/** One revision of a case's estimate as sent; a later one replaces it. */
export class Estimate extends Model<InferAttributes<Estimate>, InferCreationAttributes<Estimate>> {
  declare id: string;
  declare caseId: string;
  declare revision: number;
  declare summary: string;
  /** With tax, in minor units; a string of digits. */
  declare totalMinor: string;
  declare currency: string;
  declare writtenBy: string;
  declare sentAt: Date;
  declare answer: CreationOptional<'authorised' | 'declined' | null>;
  declare answeredAt: CreationOptional<Date | null>;
  declare recordedBy: CreationOptional<string | null>;

  static register(sequelize: Sequelize): void {
    Estimate.init(
      {
        id: { type: DataTypes.UUID, primaryKey: true },
        caseId: { type: DataTypes.UUID, allowNull: false },
        revision: { type: DataTypes.SMALLINT.UNSIGNED, allowNull: false },
        summary: { type: DataTypes.TEXT, allowNull: false },
        totalMinor: { type: DataTypes.BIGINT, allowNull: false },
        currency: { type: DataTypes.CHAR(3), allowNull: false },
        writtenBy: { type: DataTypes.UUID, allowNull: false },
        sentAt: { type: DataTypes.DATE(3), allowNull: false },
        answer: { type: DataTypes.ENUM('authorised', 'declined'), allowNull: true },
        answeredAt: { type: DataTypes.DATE(3), allowNull: true },
        recordedBy: { type: DataTypes.UUID, allowNull: true },
      },
      { sequelize, tableName: 'estimates' },
    );
  }
}
