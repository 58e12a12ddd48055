import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { CreationOptional, Sequelize } from 'sequelize';

/** Someone a case is done for: an instrument's owner, a bringer or a payer. */
export class Customer extends Model<InferAttributes<Customer>, InferCreationAttributes<Customer>> {
  declare id: string;
  declare name: string;
  declare email: CreationOptional<string | null>;
  declare telephone: CreationOptional<string | null>;
  declare address: CreationOptional<string | null>;
  declare tellBy: CreationOptional<'email' | 'telephone'>;
  declare createdAt: Date;
  declare erasedAt: CreationOptional<Date | null>;

  static register(sequelize: Sequelize): void {
    Customer.init(
      {
        id: { type: DataTypes.UUID, primaryKey: true },
        name: { type: DataTypes.STRING(160), allowNull: false },
        email: { type: DataTypes.STRING(254), allowNull: true },
        telephone: { type: DataTypes.STRING(40), allowNull: true },
        address: { type: DataTypes.STRING(400), allowNull: true },
        tellBy: { type: DataTypes.ENUM('email', 'telephone'), defaultValue: 'email' },
        createdAt: { type: DataTypes.DATE(3), allowNull: false },
        erasedAt: { type: DataTypes.DATE(3), allowNull: true },
      },
      { sequelize, tableName: 'customers' },
    );
  }
}
