import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { CreationOptional, Sequelize } from 'sequelize';

/** An instrument: it lives on across cases and owners. */
export class Instrument extends Model<
  InferAttributes<Instrument>,
  InferCreationAttributes<Instrument>
> {
  declare id: string;
  declare ownerId: string;
  declare kind: string;
  declare maker: string;
  declare model: CreationOptional<string | null>;
  declare serial: CreationOptional<string | null>;
  declare year: CreationOptional<string | null>;
  declare finish: CreationOptional<string | null>;
  declare woods: CreationOptional<string | null>;
  declare strings: CreationOptional<string | null>;
  declare tuning: CreationOptional<string | null>;
  declare marks: CreationOptional<string | null>;
  /** Minor units, as a string of digits. */
  declare declaredMinor: CreationOptional<string | null>;
  declare declaredCurrency: CreationOptional<string | null>;
  declare createdAt: Date;

  static register(sequelize: Sequelize): void {
    Instrument.init(
      {
        id: { type: DataTypes.UUID, primaryKey: true },
        ownerId: { type: DataTypes.UUID, allowNull: false },
        kind: { type: DataTypes.STRING(60), allowNull: false },
        maker: { type: DataTypes.STRING(120), allowNull: false },
        model: { type: DataTypes.STRING(120), allowNull: true },
        serial: { type: DataTypes.STRING(80), allowNull: true },
        year: { type: DataTypes.STRING(20), allowNull: true },
        finish: { type: DataTypes.STRING(160), allowNull: true },
        woods: { type: DataTypes.STRING(240), allowNull: true },
        strings: { type: DataTypes.STRING(160), allowNull: true },
        tuning: { type: DataTypes.STRING(120), allowNull: true },
        marks: { type: DataTypes.TEXT, allowNull: true },
        declaredMinor: { type: DataTypes.BIGINT, allowNull: true },
        declaredCurrency: { type: DataTypes.CHAR(3), allowNull: true },
        createdAt: { type: DataTypes.DATE(3), allowNull: false },
      },
      { sequelize, tableName: 'instruments' },
    );
  }
}
