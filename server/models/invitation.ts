import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";
import type { Role } from "#shared/contracts/account.ts";

export class Invitation extends Model<InferAttributes<Invitation>, InferCreationAttributes<Invitation>> {
  declare id: string;
  declare shopId: string;
  declare email: string;
  declare role: Role;
  declare invitedBy: string;
  declare createdAt: Date;
  declare acceptedAt: CreationOptional<Date | null>;
  declare revokedAt: CreationOptional<Date | null>;
}

export function initInvitation(sequelize: Sequelize): void {
  Invitation.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      email: DataTypes.TEXT,
      role: DataTypes.TEXT,
      invitedBy: DataTypes.UUID,
      createdAt: DataTypes.DATE,
      acceptedAt: DataTypes.DATE,
      revokedAt: DataTypes.DATE,
    },
    { sequelize, tableName: "invitations" },
  );
}
