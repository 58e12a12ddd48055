import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { CreationOptional, Sequelize } from 'sequelize';
import type { Role } from '#domain/viewer.ts';

/** Someone of the shop. `subject` is their id at the identity provider; the role is ours. */
export class Person extends Model<InferAttributes<Person>, InferCreationAttributes<Person>> {
  declare id: string;
  declare subject: string;
  declare name: string;
  declare role: Role;
  declare number: number;
  declare createdAt: Date;
  declare removedAt: CreationOptional<Date | null>;

  static register(sequelize: Sequelize): void {
    Person.init(
      {
        id: { type: DataTypes.UUID, primaryKey: true },
        subject: { type: DataTypes.STRING(255), allowNull: false },
        name: { type: DataTypes.STRING(120), allowNull: false },
        role: { type: DataTypes.ENUM('proprietor', 'technician', 'desk'), allowNull: false },
        number: { type: DataTypes.INTEGER.UNSIGNED, allowNull: false },
        createdAt: { type: DataTypes.DATE(3), allowNull: false },
        removedAt: { type: DataTypes.DATE(3), allowNull: true },
      },
      { sequelize, tableName: 'people' },
    );
  }
}
