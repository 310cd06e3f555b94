import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";

export class Reply extends Model<InferAttributes<Reply>, InferCreationAttributes<Reply>> {
  declare id: string;
  declare shopId: string;
  declare noteId: string;
  declare text: string;
  declare side: "shop" | "client";
  declare authorId: string;
  declare authorName: string;
  declare createdAt: Date;
  declare editedAt: CreationOptional<Date | null>;
}

export function initReply(sequelize: Sequelize): void {
  Reply.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      noteId: DataTypes.UUID,
      text: DataTypes.TEXT,
      side: DataTypes.TEXT,
      authorId: DataTypes.UUID,
      authorName: DataTypes.TEXT,
      createdAt: DataTypes.DATE,
      editedAt: DataTypes.DATE,
    },
    { sequelize, tableName: "replies" },
  );
}
