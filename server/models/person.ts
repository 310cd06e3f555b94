import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";

export class Person extends Model<InferAttributes<Person>, InferCreationAttributes<Person>> {
  declare id: string;
  declare email: string;
  declare name: string;
  declare passwordHash: CreationOptional<string | null>;
  /** When whoever set the password showed that they read this address; null when they only typed it. */
  declare addressProvenAt: CreationOptional<Date | null>;
  declare createdAt: Date;
}

export function initPerson(sequelize: Sequelize): void {
  Person.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      email: DataTypes.TEXT,
      name: DataTypes.TEXT,
      passwordHash: DataTypes.TEXT,
      addressProvenAt: DataTypes.DATE,
      createdAt: DataTypes.DATE,
    },
    { sequelize, tableName: "people" },
  );
}
