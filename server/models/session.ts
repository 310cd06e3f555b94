import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";

export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  declare id: string;
  declare personId: string;
  declare began: "password" | "link";
  declare agent: string;
  declare createdAt: Date;
  declare lastSeenAt: Date;
  declare expiresAt: Date;
  declare endedAt: CreationOptional<Date | null>;
}

export function initSession(sequelize: Sequelize): void {
  Session.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      personId: DataTypes.UUID,
      began: DataTypes.TEXT,
      agent: DataTypes.TEXT,
      createdAt: DataTypes.DATE,
      lastSeenAt: DataTypes.DATE,
      expiresAt: DataTypes.DATE,
      endedAt: DataTypes.DATE,
    },
    { sequelize, tableName: "sessions" },
  );
}
