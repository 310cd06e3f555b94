import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";
import type { Role } from "#shared/contracts/account.ts";

export class Membership extends Model<InferAttributes<Membership>, InferCreationAttributes<Membership>> {
  declare id: string;
  declare shopId: string;
  declare personId: string;
  declare role: Role;
  declare createdAt: Date;
  declare endedAt: CreationOptional<Date | null>;
}

export function initMembership(sequelize: Sequelize): void {
  Membership.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      personId: DataTypes.UUID,
      role: DataTypes.TEXT,
      createdAt: DataTypes.DATE,
      endedAt: DataTypes.DATE,
    },
    { sequelize, tableName: "memberships" },
  );
}
