import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from "sequelize";

export class ShopSaws extends Model<InferAttributes<ShopSaws>, InferCreationAttributes<ShopSaws>> {
  declare shopId: string;
  declare version: number;
  /** Only what differs from the defaults. Written by an older version it may hold what is no longer asked. */
  declare own: Readonly<Record<string, unknown>>;
  declare savedBy: string;
  declare savedAt: Date;
}

export function initShopSaws(sequelize: Sequelize): void {
  ShopSaws.init(
    {
      shopId: { type: DataTypes.UUID, primaryKey: true },
      version: DataTypes.INTEGER,
      own: DataTypes.JSONB,
      savedBy: DataTypes.UUID,
      savedAt: DataTypes.DATE,
    },
    { sequelize, tableName: "shop_saws" },
  );
}
