import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { CreationOptional, Sequelize } from 'sequelize';

/** A wait for glue or finish, begun by an entry, with up to three times. */
export class Rest extends Model<InferAttributes<Rest>, InferCreationAttributes<Rest>> {
  declare id: string;
  declare caseId: string;
  declare entryId: string;
  declare product: string;
  declare startedAt: Date;
  declare clampsOffAt: CreationOptional<Date | null>;
  declare workedAt: CreationOptional<Date | null>;
  declare stringsAt: CreationOptional<Date | null>;

  static register(sequelize: Sequelize): void {
    Rest.init(
      {
        id: { type: DataTypes.UUID, primaryKey: true },
        caseId: { type: DataTypes.UUID, allowNull: false },
        entryId: { type: DataTypes.UUID, allowNull: false },
        product: { type: DataTypes.STRING(120), allowNull: false },
        startedAt: { type: DataTypes.DATE(3), allowNull: false },
        clampsOffAt: { type: DataTypes.DATE(3), allowNull: true },
        workedAt: { type: DataTypes.DATE(3), allowNull: true },
        stringsAt: { type: DataTypes.DATE(3), allowNull: true },
      },
      { sequelize, tableName: 'rests' },
    );
  }
}
