import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";
import type { Brief } from "#shared/contracts/jobs.ts";
import type { JobState } from "#shared/lifecycle/job-states.ts";
import type { Move } from "#shared/lifecycle/whose-move.ts";

export class Job extends Model<InferAttributes<Job>, InferCreationAttributes<Job>> {
  declare id: string;
  declare shopId: string;
  declare clientId: string;
  declare number: string;
  declare title: string;
  declare dueOn: CreationOptional<string | null>;
  declare brief: Brief;
  declare state: JobState;
  declare heldFrom: CreationOptional<JobState | null>;
  declare whoseMove: Move;
  declare nextNoteNumber: CreationOptional<number>;
  declare consentAt: CreationOptional<Date | null>;
  declare consentBy: CreationOptional<string | null>;
  declare createdBy: string;
  declare createdAt: Date;
}

export function initJob(sequelize: Sequelize): void {
  Job.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      clientId: DataTypes.UUID,
      number: DataTypes.TEXT,
      title: DataTypes.TEXT,
      dueOn: DataTypes.DATEONLY,
      brief: DataTypes.JSONB,
      state: DataTypes.TEXT,
      heldFrom: DataTypes.TEXT,
      whoseMove: DataTypes.TEXT,
      nextNoteNumber: { type: DataTypes.INTEGER, defaultValue: 1 },
      consentAt: DataTypes.DATE,
      consentBy: DataTypes.UUID,
      createdBy: DataTypes.UUID,
      createdAt: DataTypes.DATE,
    },
    { sequelize, tableName: "jobs" },
  );
}
