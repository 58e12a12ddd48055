import { DataTypes, Model, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { CreationOptional, Sequelize } from 'sequelize';
import type { Phase, Visibility } from '#domain/entry-draft.ts';

/** A dated record in a case. Its words are in `draft` until sealing, then in the sealed part alone. */
export class Entry extends Model<InferAttributes<Entry>, InferCreationAttributes<Entry>> {
  declare id: string;
  declare caseId: string;
  declare kind: string;
  declare phase: Phase;
  declare visibility: Visibility;
  declare amendsId: CreationOptional<string | null>;
  /** JSON text of an EntryDraft. */
  declare draft: string | null;
  declare occurredAt: CreationOptional<Date | null>;
  declare writtenBy: string | null;
  declare writtenAt: Date;
  declare editedAt: Date;
  declare leafIndex: CreationOptional<string | null>;
  declare sealedAt: CreationOptional<Date | null>;
  declare sealedBy: CreationOptional<string | null>;

  static register(sequelize: Sequelize): void {
    Entry.init(
      {
        id: { type: DataTypes.UUID, primaryKey: true },
        caseId: { type: DataTypes.UUID, allowNull: false },
        kind: { type: DataTypes.STRING(20), allowNull: false },
        phase: { type: DataTypes.ENUM('before', 'during', 'after'), allowNull: false },
        visibility: { type: DataTypes.ENUM('shared', 'bench'), allowNull: false },
        amendsId: { type: DataTypes.UUID, allowNull: true },
        draft: { type: DataTypes.TEXT('medium'), allowNull: true },
        occurredAt: { type: DataTypes.DATE(3), allowNull: true },
        writtenBy: { type: DataTypes.UUID, allowNull: true },
        writtenAt: { type: DataTypes.DATE(3), allowNull: false },
        editedAt: { type: DataTypes.DATE(3), allowNull: false },
        leafIndex: { type: DataTypes.BIGINT.UNSIGNED, allowNull: true },
        sealedAt: { type: DataTypes.DATE(3), allowNull: true },
        sealedBy: { type: DataTypes.UUID, allowNull: true },
      },
      { sequelize, tableName: 'entries' },
    );
  }
}
