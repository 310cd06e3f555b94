import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";

/** A photo of the wall that a job's sign is to hang on, upright and without metadata. */
export class WallPhoto extends Model<InferAttributes<WallPhoto>, InferCreationAttributes<WallPhoto>> {
  declare id: string;
  declare shopId: string;
  declare jobId: string;
  declare fileId: string;
  declare name: string;
  declare widthPx: number;
  declare heightPx: number;
  declare addedBy: string;
  declare addedAt: Date;
  declare removedAt: CreationOptional<Date | null>;
}

export function initWallPhoto(sequelize: Sequelize): void {
  WallPhoto.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      jobId: DataTypes.UUID,
      fileId: DataTypes.UUID,
      name: DataTypes.TEXT,
      widthPx: DataTypes.INTEGER,
      heightPx: DataTypes.INTEGER,
      addedBy: DataTypes.UUID,
      addedAt: DataTypes.DATE,
      removedAt: DataTypes.DATE,
    },
    { sequelize, tableName: "wall_photos" },
  );
}
