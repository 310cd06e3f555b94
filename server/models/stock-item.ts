import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";
import type { StockKind } from "#shared/contracts/stock-entry.ts";

/** The stock's own record: a material or part as shared/mockup/document.ts has it, with the thicknesses and sheets on hand. */
export type StockProperties = Readonly<Record<string, unknown>>;

export class StockItem extends Model<InferAttributes<StockItem>, InferCreationAttributes<StockItem>> {
  declare id: string;
  declare shopId: string;
  declare kind: StockKind;
  declare name: string;
  declare properties: StockProperties;
  declare quantity: CreationOptional<number | null>;
  declare version: CreationOptional<number>;
  declare createdAt: Date;
  declare retiredAt: CreationOptional<Date | null>;
}

export function initStockItem(sequelize: Sequelize): void {
  StockItem.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      kind: DataTypes.TEXT,
      name: DataTypes.TEXT,
      properties: DataTypes.JSONB,
      quantity: DataTypes.INTEGER,
      version: { type: DataTypes.INTEGER, defaultValue: 1 },
      createdAt: DataTypes.DATE,
      retiredAt: DataTypes.DATE,
    },
    { sequelize, tableName: "stock_items" },
  );
}
