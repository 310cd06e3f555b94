import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from "sequelize";

export class Mockup extends Model<InferAttributes<Mockup>, InferCreationAttributes<Mockup>> {
  declare id: string;
  declare shopId: string;
  declare jobId: string;
  declare version: number;
  declare document: string;
  declare savedBy: string;
  declare savedAt: Date;
}

export function initMockup(sequelize: Sequelize): void {
  Mockup.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      jobId: DataTypes.UUID,
      version: DataTypes.INTEGER,
      document: DataTypes.TEXT,
      savedBy: DataTypes.UUID,
      savedAt: DataTypes.DATE,
    },
    { sequelize, tableName: "mockups" },
  );
}
