import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { CreationOptional, Sequelize } from 'sequelize';

/** A photo of a case: its original in the object store, and what is known of it. */
export class Photo extends Model<InferAttributes<Photo>, InferCreationAttributes<Photo>> {
  declare id: string;
  declare caseId: string;
  /** Within the case, from 1. */
  declare number: number;
  /** Of the original. */
  declare sha256: Buffer;
  declare bytes: number;
  declare mediaType: string;
  declare objectKey: string;
  declare fileName: string | null;
  declare uploadedBy: string;
  declare receivedAt: Date;
  /** ready: the copies are there. failed: none can be made, see `failedBecause`. */
  declare state: CreationOptional<'waiting' | 'ready' | 'failed'>;
  declare failedBecause: CreationOptional<string | null>;
  /** Px; as stored in the file while waiting, upright once ready. */
  declare width: number;
  declare height: number;
  /** The camera's clock, "2026-03-08T01:59:59.250", and what zone it says it is in. */
  declare takenClock: CreationOptional<string | null>;
  declare takenOffset: CreationOptional<string | null>;
  /** Only where the offset is known. */
  declare takenAt: CreationOptional<Date | null>;
  /** Whether the original tells, or may tell, where it was taken. */
  declare hasPosition: CreationOptional<boolean>;
  /** A ThumbHash. */
  declare placeholder: CreationOptional<Buffer | null>;

  static register(sequelize: Sequelize): void {
    Photo.init(
      {
        id: { type: DataTypes.UUID, primaryKey: true },
        caseId: { type: DataTypes.UUID, allowNull: false },
        number: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
        sha256: { type: DataTypes.BLOB, allowNull: false },
        bytes: { type: DataTypes.BIGINT.UNSIGNED, allowNull: false },
        mediaType: { type: DataTypes.STRING(40), allowNull: false },
        objectKey: { type: DataTypes.STRING(120), allowNull: false },
        fileName: { type: DataTypes.STRING(200), allowNull: true },
        uploadedBy: { type: DataTypes.UUID, allowNull: false },
        receivedAt: { type: DataTypes.DATE(3), allowNull: false },
        state: { type: DataTypes.ENUM('waiting', 'ready', 'failed'), defaultValue: 'waiting' },
        failedBecause: { type: DataTypes.STRING(240), allowNull: true },
        width: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
        height: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
        takenClock: { type: DataTypes.CHAR(23), allowNull: true },
        takenOffset: { type: DataTypes.CHAR(6), allowNull: true },
        takenAt: { type: DataTypes.DATE(3), allowNull: true },
        hasPosition: { type: DataTypes.BOOLEAN, defaultValue: false },
        placeholder: { type: DataTypes.BLOB, allowNull: true },
      },
      { sequelize, tableName: 'photos' },
    );
  }
}
