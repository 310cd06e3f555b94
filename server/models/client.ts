import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";

export class Client extends Model<InferAttributes<Client>, InferCreationAttributes<Client>> {
  declare id: string;
  declare shopId: string;
  declare name: string;
  declare remarks: CreationOptional<string>;
  declare createdAt: Date;
}

export function initClient(sequelize: Sequelize): void {
  Client.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      name: DataTypes.TEXT,
      remarks: { type: DataTypes.TEXT, defaultValue: "" },
      createdAt: DataTypes.DATE,
    },
    { sequelize, tableName: "clients" },
  );
}
