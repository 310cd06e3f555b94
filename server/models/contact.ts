import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";

export class Contact extends Model<InferAttributes<Contact>, InferCreationAttributes<Contact>> {
  declare id: string;
  declare shopId: string;
  declare clientId: string;
  declare personId: string;
  declare name: string;
  declare createdAt: Date;
  declare endedAt: CreationOptional<Date | null>;
}

export function initContact(sequelize: Sequelize): void {
  Contact.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      clientId: DataTypes.UUID,
      personId: DataTypes.UUID,
      name: DataTypes.TEXT,
      createdAt: DataTypes.DATE,
      endedAt: DataTypes.DATE,
    },
    { sequelize, tableName: "contacts" },
  );
}
