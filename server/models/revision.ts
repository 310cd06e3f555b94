import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";
import type { RevisionState } from "#shared/lifecycle/revision-states.ts";

export class Revision extends Model<InferAttributes<Revision>, InferCreationAttributes<Revision>> {
  declare id: string;
  declare shopId: string;
  declare jobId: string;
  declare letter: string;
  declare sequence: number;
  declare state: RevisionState;
  declare message: CreationOptional<string>;
  declare snapshot: CreationOptional<string | null>;
  declare snapshotSha256: CreationOptional<string | null>;
  /** How long the sign dries in all, whole hours. */
  declare dryingHours: CreationOptional<number>;
  declare pdfFileId: CreationOptional<string | null>;
  declare issuedBy: string;
  declare requestedAt: Date;
  declare issuedAt: CreationOptional<Date | null>;
  declare failure: CreationOptional<string | null>;
  declare withdrawnReason: CreationOptional<string | null>;
}

export function initRevision(sequelize: Sequelize): void {
  Revision.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      jobId: DataTypes.UUID,
      letter: DataTypes.TEXT,
      sequence: DataTypes.INTEGER,
      state: DataTypes.TEXT,
      message: { type: DataTypes.TEXT, defaultValue: "" },
      snapshot: DataTypes.TEXT,
      snapshotSha256: DataTypes.TEXT,
      dryingHours: { type: DataTypes.INTEGER, defaultValue: 0 },
      pdfFileId: DataTypes.UUID,
      issuedBy: DataTypes.UUID,
      requestedAt: DataTypes.DATE,
      issuedAt: DataTypes.DATE,
      failure: DataTypes.TEXT,
      withdrawnReason: DataTypes.TEXT,
    },
    { sequelize, tableName: "revisions" },
  );
}
