import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { CreationOptional, Sequelize } from 'sequelize';

/** The shop itself: one row, id 1. */
export class Shop extends Model<InferAttributes<Shop>, InferCreationAttributes<Shop>> {
  declare id: CreationOptional<number>;
  declare name: string;
  declare place: string;
  declare address: string;
  declare telephone: string;
  declare email: string;
  /** ISO 4217 */
  declare currency: string;
  /** IANA name. */
  declare timeZone: string;
  declare lengthUnit: CreationOptional<'mm' | 'in'>;
  declare forceUnit: CreationOptional<'N' | 'lbf'>;
  declare warrantyTerms: string;
  declare createdAt: Date;

  static register(sequelize: Sequelize): void {
    Shop.init(
      {
        id: { type: DataTypes.TINYINT.UNSIGNED, primaryKey: true, defaultValue: 1 },
        name: { type: DataTypes.STRING(120), allowNull: false },
        place: { type: DataTypes.STRING(120), allowNull: false },
        address: { type: DataTypes.STRING(400), allowNull: false },
        telephone: { type: DataTypes.STRING(40), allowNull: false },
        email: { type: DataTypes.STRING(254), allowNull: false },
        currency: { type: DataTypes.CHAR(3), allowNull: false },
        timeZone: { type: DataTypes.STRING(64), allowNull: false },
        lengthUnit: { type: DataTypes.ENUM('mm', 'in'), defaultValue: 'mm' },
        forceUnit: { type: DataTypes.ENUM('N', 'lbf'), defaultValue: 'N' },
        warrantyTerms: { type: DataTypes.TEXT, allowNull: false },
        createdAt: { type: DataTypes.DATE(3), allowNull: false },
      },
      { sequelize, tableName: 'shops' },
    );
  }
}
