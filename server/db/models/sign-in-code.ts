import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { CreationOptional, Sequelize } from 'sequelize';

/**
 * A code that was asked for. `customerId` is null when the address is nobody's: the row is written
 * all the same, so that the work and the time do not tell.
 */
export class SignInCode extends Model<
  InferAttributes<SignInCode>,
  InferCreationAttributes<SignInCode>
> {
  declare id: string;
  declare customerId: string | null;
  declare browserHash: Buffer;
  declare codeHmac: Buffer;
  declare tries: CreationOptional<number>;
  declare createdAt: Date;
  declare expiresAt: Date;
  declare usedAt: CreationOptional<Date | null>;

  static register(sequelize: Sequelize): void {
    SignInCode.init(
      {
        id: { type: DataTypes.UUID, primaryKey: true },
        customerId: { type: DataTypes.UUID, allowNull: true },
        browserHash: { type: DataTypes.BLOB, allowNull: false },
        codeHmac: { type: DataTypes.BLOB, allowNull: false },
        tries: { type: DataTypes.TINYINT.UNSIGNED, allowNull: false, defaultValue: 0 },
        createdAt: { type: DataTypes.DATE(3), allowNull: false },
        expiresAt: { type: DataTypes.DATE(3), allowNull: false },
        usedAt: { type: DataTypes.DATE(3), allowNull: true },
      },
      { sequelize, tableName: 'sign_in_codes' },
    );
  }
}
