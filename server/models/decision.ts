import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";

export class Decision extends Model<InferAttributes<Decision>, InferCreationAttributes<Decision>> {
  declare id: string;
  declare shopId: string;
  declare jobId: string;
  declare revisionId: string;
  declare kind: "approved" | "revision asked";
  declare contactId: string;
  declare personId: string;
  declare byName: string;
  declare typedName: CreationOptional<string | null>;
  declare acknowledgements: CreationOptional<string | null>;
  declare summary: CreationOptional<string>;
  declare pdfSha256: string;
  declare snapshotSha256: string;
  declare address: string;
  declare agent: string;
  declare decidedAt: Date;
}

export function initDecision(sequelize: Sequelize): void {
  Decision.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      jobId: DataTypes.UUID,
      revisionId: DataTypes.UUID,
      kind: DataTypes.TEXT,
      contactId: DataTypes.UUID,
      personId: DataTypes.UUID,
      byName: DataTypes.TEXT,
      typedName: DataTypes.TEXT,
      acknowledgements: DataTypes.TEXT,
      summary: { type: DataTypes.TEXT, defaultValue: "" },
      pdfSha256: DataTypes.TEXT,
      snapshotSha256: DataTypes.TEXT,
      address: DataTypes.TEXT,
      agent: DataTypes.TEXT,
      decidedAt: DataTypes.DATE,
    },
    { sequelize, tableName: "decisions" },
  );
}
