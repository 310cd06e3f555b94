import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";
import type { Anchor } from "#shared/contracts/notes.ts";

export class Note extends Model<InferAttributes<Note>, InferCreationAttributes<Note>> {
  declare id: string;
  declare shopId: string;
  declare jobId: string;
  declare revisionId: string;
  declare number: number;
  declare kind: "must change" | "question" | "fine as is";
  declare state: CreationOptional<"open" | "answered" | "settled">;
  declare text: string;
  declare anchor: Anchor;
  declare zone: CreationOptional<string | null>;
  declare side: "shop" | "client";
  declare shopOnly: CreationOptional<boolean>;
  declare authorId: string;
  declare authorName: string;
  declare createdAt: Date;
  declare editedAt: CreationOptional<Date | null>;
}

export function initNote(sequelize: Sequelize): void {
  Note.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      jobId: DataTypes.UUID,
      revisionId: DataTypes.UUID,
      number: DataTypes.INTEGER,
      kind: DataTypes.TEXT,
      state: { type: DataTypes.TEXT, defaultValue: "open" },
      text: DataTypes.TEXT,
      anchor: DataTypes.JSONB,
      zone: DataTypes.TEXT,
      side: DataTypes.TEXT,
      shopOnly: { type: DataTypes.BOOLEAN, defaultValue: false },
      authorId: DataTypes.UUID,
      authorName: DataTypes.TEXT,
      createdAt: DataTypes.DATE,
      editedAt: DataTypes.DATE,
    },
    { sequelize, tableName: "notes" },
  );
}
