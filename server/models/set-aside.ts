import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";
import type { BoundFinding } from "#shared/dry-fit/set-aside.ts";

/** A finding of a job's dry fit that was set aside; in force until it is taken back. */
export class SetAside extends Model<InferAttributes<SetAside>, InferCreationAttributes<SetAside>> {
  declare id: string;
  declare shopId: string;
  declare jobId: string;
  declare rule: number;
  declare severity: BoundFinding["severity"];
  declare bindingSha256: string;
  declare finding: BoundFinding;
  declare reason: string;
  declare setAsideBy: string;
  declare setAsideName: string;
  declare setAsideRole: "owner" | "maker";
  declare setAsideAt: Date;
  declare takenBackBy: CreationOptional<string | null>;
  declare takenBackName: CreationOptional<string | null>;
  declare takenBackAt: CreationOptional<Date | null>;
}

export function initSetAside(sequelize: Sequelize): void {
  SetAside.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      jobId: DataTypes.UUID,
      rule: DataTypes.INTEGER,
      severity: DataTypes.TEXT,
      bindingSha256: DataTypes.TEXT,
      finding: DataTypes.JSONB,
      reason: DataTypes.TEXT,
      setAsideBy: DataTypes.UUID,
      setAsideName: DataTypes.TEXT,
      setAsideRole: DataTypes.TEXT,
      setAsideAt: DataTypes.DATE,
      takenBackBy: DataTypes.UUID,
      takenBackName: DataTypes.TEXT,
      takenBackAt: DataTypes.DATE,
    },
    { sequelize, tableName: "set_asides" },
  );
}
