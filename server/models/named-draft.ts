import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";

/** A state of a job's mockup that was kept under a name; without its document once it is removed. */
export class NamedDraft extends Model<InferAttributes<NamedDraft>, InferCreationAttributes<NamedDraft>> {
  declare id: string;
  declare shopId: string;
  declare jobId: string;
  declare name: string;
  declare document: string | null;
  declare keptBy: string;
  declare keptAt: Date;
  declare removedAt: CreationOptional<Date | null>;
}

export function initNamedDraft(sequelize: Sequelize): void {
  NamedDraft.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      jobId: DataTypes.UUID,
      name: DataTypes.TEXT,
      document: DataTypes.TEXT,
      keptBy: DataTypes.UUID,
      keptAt: DataTypes.DATE,
      removedAt: DataTypes.DATE,
    },
    { sequelize, tableName: "named_drafts" },
  );
}
