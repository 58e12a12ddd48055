import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { CreationOptional, Sequelize } from 'sequelize';

/** A numbered mark on a photo of a draft; sealing moves it into the sealed part. */
export class Pin extends Model<InferAttributes<Pin>, InferCreationAttributes<Pin>> {
  declare id: string;
  declare entryPhotoId: string;
  declare number: number;
  /** Place on the upright photo, from its left and its top, in 1/10000 of its sides. */
  declare x: number;
  declare y: number;
  declare kind: 'damage' | 'remark';
  declare label: string;
  declare note: CreationOptional<string>;

  static register(sequelize: Sequelize): void {
    Pin.init(
      {
        id: { type: DataTypes.UUID, primaryKey: true },
        entryPhotoId: { type: DataTypes.UUID, allowNull: false },
        number: { type: DataTypes.SMALLINT.UNSIGNED, allowNull: false },
        x: { type: DataTypes.SMALLINT.UNSIGNED, allowNull: false },
        y: { type: DataTypes.SMALLINT.UNSIGNED, allowNull: false },
        kind: { type: DataTypes.ENUM('damage', 'remark'), allowNull: false },
        label: { type: DataTypes.STRING(120), allowNull: false },
        note: { type: DataTypes.STRING(400), defaultValue: '' },
      },
      { sequelize, tableName: 'pins' },
    );
  }
}
