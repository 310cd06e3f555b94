import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from "sequelize";

export class StoredFile extends Model<InferAttributes<StoredFile>, InferCreationAttributes<StoredFile>> {
  declare id: string;
  declare shopId: string;
  declare sha256: string;
  declare byteSize: number;
  declare mediaType: string;
  declare storageKey: string;
  declare createdAt: Date;
}

export function initStoredFile(sequelize: Sequelize): void {
  StoredFile.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      sha256: DataTypes.TEXT,
      byteSize: DataTypes.INTEGER,
      mediaType: DataTypes.TEXT,
      storageKey: DataTypes.TEXT,
      createdAt: DataTypes.DATE,
    },
    { sequelize, tableName: "stored_files" },
  );
}
