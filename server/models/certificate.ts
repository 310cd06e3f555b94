import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from "sequelize";

export class Certificate extends Model<InferAttributes<Certificate>, InferCreationAttributes<Certificate>> {
  declare id: string;
  declare shopId: string;
  declare decisionId: string;
  declare fileId: string;
  declare createdAt: Date;
}

export function initCertificate(sequelize: Sequelize): void {
  Certificate.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      decisionId: DataTypes.UUID,
      fileId: DataTypes.UUID,
      createdAt: DataTypes.DATE,
    },
    { sequelize, tableName: "certificates" },
  );
}
