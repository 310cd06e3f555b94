import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from "sequelize";

/** What the mockup of a job begins with that was opened as another like an earlier job of the shop. */
export class MockupStart extends Model<InferAttributes<MockupStart>, InferCreationAttributes<MockupStart>> {
  declare jobId: string;
  declare shopId: string;
  declare likeJobId: string;
  declare document: string;
  declare madeBy: string;
  declare madeAt: Date;
}

export function initMockupStart(sequelize: Sequelize): void {
  MockupStart.init(
    {
      jobId: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      likeJobId: DataTypes.UUID,
      document: DataTypes.TEXT,
      madeBy: DataTypes.UUID,
      madeAt: DataTypes.DATE,
    },
    { sequelize, tableName: "mockup_starts" },
  );
}
