import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from "sequelize";

export class JobApprover extends Model<InferAttributes<JobApprover>, InferCreationAttributes<JobApprover>> {
  declare jobId: string;
  declare contactId: string;
  declare shopId: string;
}

export function initJobApprover(sequelize: Sequelize): void {
  JobApprover.init(
    {
      jobId: { type: DataTypes.UUID, primaryKey: true },
      contactId: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
    },
    { sequelize, tableName: "job_approvers" },
  );
}
