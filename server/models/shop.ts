import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";

export class Shop extends Model<InferAttributes<Shop>, InferCreationAttributes<Shop>> {
  declare id: string;
  declare slug: string;
  declare name: string;
  declare unit: "mm" | "in";
  declare jobPrefix: string;
  declare nextJobNumber: CreationOptional<number>;
  declare paper: "A4" | "A3" | "Letter" | "Tabloid";
  /** The IANA zone whose day and hour count for the shop. */
  declare timeZone: CreationOptional<string>;
  /** Working days from the yes until a sign leaves the bench, without what dries. */
  declare buildDays: CreationOptional<number>;
  declare freightDays: CreationOptional<number>;
  declare demo: CreationOptional<boolean>;
  declare createdAt: Date;
}

export function initShop(sequelize: Sequelize): void {
  Shop.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      slug: DataTypes.TEXT,
      name: DataTypes.TEXT,
      unit: DataTypes.TEXT,
      jobPrefix: DataTypes.TEXT,
      nextJobNumber: { type: DataTypes.INTEGER, defaultValue: 1 },
      paper: DataTypes.TEXT,
      timeZone: { type: DataTypes.TEXT, defaultValue: "UTC" },
      buildDays: { type: DataTypes.INTEGER, defaultValue: 5 },
      freightDays: { type: DataTypes.INTEGER, defaultValue: 2 },
      demo: { type: DataTypes.BOOLEAN, defaultValue: false },
      createdAt: DataTypes.DATE,
    },
    { sequelize, tableName: "shops" },
  );
}
