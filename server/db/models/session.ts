import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { CreationOptional, Sequelize } from 'sequelize';

/** A signed-in browser. `idHash` is the SHA-256 of the id that only the browser's cookie holds. */
export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  declare idHash: Buffer;
  declare personId: CreationOptional<string | null>;
  declare customerId: CreationOptional<string | null>;
  declare createdAt: Date;
  declare freshAt: Date;
  declare seenAt: Date;
  declare expiresAt: Date;

  static register(sequelize: Sequelize): void {
    Session.init(
      {
        idHash: { type: DataTypes.BLOB, primaryKey: true },
        personId: { type: DataTypes.UUID, allowNull: true },
        customerId: { type: DataTypes.UUID, allowNull: true },
        createdAt: { type: DataTypes.DATE(3), allowNull: false },
        freshAt: { type: DataTypes.DATE(3), allowNull: false },
        seenAt: { type: DataTypes.DATE(3), allowNull: false },
        expiresAt: { type: DataTypes.DATE(3), allowNull: false },
      },
      { sequelize, tableName: 'sessions' },
    );
  }
}
