import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { CreationOptional, Sequelize } from 'sequelize';

/** One repair of one instrument. */
export class Case extends Model<InferAttributes<Case>, InferCreationAttributes<Case>> {
  declare id: string;
  declare year: number;
  declare ordinal: number;
  /** The 16 random bytes by which the witness log knows the case; never all zeros. */
  declare record: Buffer;
  /** The random code on the printed tag. */
  declare tagCode: string;
  declare instrumentId: string;
  declare technicianId: CreationOptional<string | null>;
  declare takenInBy: string;
  declare takenInAt: Date;
  declare complaint: string;
  declare job: string;
  declare accessories: CreationOptional<string>;
  declare consentPhotos: boolean;
  declare consentPublish: CreationOptional<'number' | 'work'>;
  /** A calendar day, "2026-04-24". */
  declare promisedOn: CreationOptional<string | null>;
  declare nextStep: CreationOptional<string | null>;
  declare place: CreationOptional<string | null>;
  declare onHold: CreationOptional<string | null>;
  declare lastPhoto: CreationOptional<number>;
  declare closedAt: CreationOptional<Date | null>;
  declare ownerToldAt: CreationOptional<Date | null>;
  declare handedBackAt: CreationOptional<Date | null>;
  /** Counts changes; a string of digits. */
  declare version: CreationOptional<string>;

  static register(sequelize: Sequelize): void {
    Case.init(
      {
        id: { type: DataTypes.UUID, primaryKey: true },
        year: { type: DataTypes.SMALLINT.UNSIGNED, allowNull: false },
        ordinal: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
        record: { type: DataTypes.BLOB, allowNull: false },
        tagCode: { type: DataTypes.CHAR(16), allowNull: false },
        instrumentId: { type: DataTypes.UUID, allowNull: false },
        technicianId: { type: DataTypes.UUID, allowNull: true },
        takenInBy: { type: DataTypes.UUID, allowNull: false },
        takenInAt: { type: DataTypes.DATE(3), allowNull: false },
        complaint: { type: DataTypes.TEXT, allowNull: false },
        job: { type: DataTypes.STRING(160), allowNull: false },
        accessories: { type: DataTypes.STRING(400), defaultValue: '' },
        consentPhotos: { type: DataTypes.BOOLEAN, allowNull: false },
        consentPublish: { type: DataTypes.ENUM('number', 'work'), defaultValue: 'number' },
        promisedOn: { type: DataTypes.DATEONLY, allowNull: true },
        nextStep: { type: DataTypes.STRING(160), allowNull: true },
        place: { type: DataTypes.STRING(80), allowNull: true },
        onHold: { type: DataTypes.STRING(240), allowNull: true },
        lastPhoto: { type: DataTypes.INTEGER.UNSIGNED, defaultValue: 0 },
        closedAt: { type: DataTypes.DATE(3), allowNull: true },
        ownerToldAt: { type: DataTypes.DATE(3), allowNull: true },
        handedBackAt: { type: DataTypes.DATE(3), allowNull: true },
        version: { type: DataTypes.BIGINT.UNSIGNED, defaultValue: '0' },
      },
      { sequelize, tableName: 'cases' },
    );
  }
}
