import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from "sequelize";
import type { PriceBook as Book } from "#shared/cost/price-book.ts";

export class PriceBook extends Model<InferAttributes<PriceBook>, InferCreationAttributes<PriceBook>> {
  declare shopId: string;
  declare version: number;
  declare book: Book;
  declare savedBy: string;
  declare savedAt: Date;
}

export function initPriceBook(sequelize: Sequelize): void {
  PriceBook.init(
    {
      shopId: { type: DataTypes.UUID, primaryKey: true },
      version: DataTypes.INTEGER,
      book: DataTypes.JSONB,
      savedBy: DataTypes.UUID,
      savedAt: DataTypes.DATE,
    },
    { sequelize, tableName: "price_books" },
  );
}
