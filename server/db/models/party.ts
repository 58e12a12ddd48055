import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { Sequelize } from 'sequelize';

/** What a customer is in one case. One person often takes all three parts. */
export class Party extends Model<InferAttributes<Party>, InferCreationAttributes<Party>> {
  declare caseId: string;
  declare part: 'owner' | 'bringer' | 'payer';
  declare customerId: string;

  static register(sequelize: Sequelize): void {
    Party.init(
      {
        caseId: { type: DataTypes.UUID, primaryKey: true },
        part: { type: DataTypes.ENUM('owner', 'bringer', 'payer'), primaryKey: true },
        customerId: { type: DataTypes.UUID, allowNull: false },
      },
      { sequelize, tableName: 'parties' },
    );
  }
}
