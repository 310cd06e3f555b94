import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";

export class ShareLink extends Model<InferAttributes<ShareLink>, InferCreationAttributes<ShareLink>> {
  declare id: string;
  declare shopId: string;
  declare tokenHash: string;
  declare label: string;
  declare createdBy: string;
  declare createdAt: Date;
  declare expiresAt: Date;
  declare revokedAt: CreationOptional<Date | null>;
  declare openings: CreationOptional<number>;
  declare lastOpenedAt: CreationOptional<Date | null>;
}

export function initShareLink(sequelize: Sequelize): void {
  ShareLink.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      tokenHash: DataTypes.TEXT,
      label: DataTypes.TEXT,
      createdBy: DataTypes.UUID,
      createdAt: DataTypes.DATE,
      expiresAt: DataTypes.DATE,
      revokedAt: DataTypes.DATE,
      openings: { type: DataTypes.INTEGER, defaultValue: 0 },
      lastOpenedAt: DataTypes.DATE,
    },
    { sequelize, tableName: "share_links" },
  );
}
