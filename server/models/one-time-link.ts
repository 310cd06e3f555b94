import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";

export class OneTimeLink extends Model<InferAttributes<OneTimeLink>, InferCreationAttributes<OneTimeLink>> {
  declare id: string;
  declare tokenHash: string;
  declare purpose: "sign in" | "join shop" | "new password";
  declare mailId: string;
  declare address: string;
  declare shopId: CreationOptional<string | null>;
  declare personId: CreationOptional<string | null>;
  declare contactId: CreationOptional<string | null>;
  declare invitationId: CreationOptional<string | null>;
  declare goTo: CreationOptional<string | null>;
  declare createdAt: Date;
  declare expiresAt: Date;
  declare spentAt: CreationOptional<Date | null>;
  declare killedAt: CreationOptional<Date | null>;
}

export function initOneTimeLink(sequelize: Sequelize): void {
  OneTimeLink.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      tokenHash: DataTypes.TEXT,
      purpose: DataTypes.TEXT,
      mailId: DataTypes.UUID,
      address: DataTypes.TEXT,
      shopId: DataTypes.UUID,
      personId: DataTypes.UUID,
      contactId: DataTypes.UUID,
      invitationId: DataTypes.UUID,
      goTo: DataTypes.TEXT,
      createdAt: DataTypes.DATE,
      expiresAt: DataTypes.DATE,
      spentAt: DataTypes.DATE,
      killedAt: DataTypes.DATE,
    },
    { sequelize, tableName: "one_time_links" },
  );
}
