import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { Sequelize } from 'sequelize';

/** A WebP made from a photo, upright, with a long side of at most `edge` px. The one of 2048 is the published copy. */
export class PhotoCopy extends Model<
  InferAttributes<PhotoCopy>,
  InferCreationAttributes<PhotoCopy>
> {
  declare photoId: string;
  declare edge: number;
  declare objectKey: string;
  declare sha256: Buffer;
  declare bytes: number;
  declare width: number;
  declare height: number;

  static register(sequelize: Sequelize): void {
    PhotoCopy.init(
      {
        photoId: { type: DataTypes.UUID, primaryKey: true },
        edge: { type: DataTypes.SMALLINT.UNSIGNED, primaryKey: true },
        objectKey: { type: DataTypes.STRING(120), allowNull: false },
        sha256: { type: DataTypes.BLOB, allowNull: false },
        bytes: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
        width: { type: DataTypes.SMALLINT.UNSIGNED, allowNull: false },
        height: { type: DataTypes.SMALLINT.UNSIGNED, allowNull: false },
      },
      { sequelize, tableName: 'photo_copies' },
    );
  }
}
