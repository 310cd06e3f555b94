import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from "sequelize";

/** Whose mails of which shop a token stops. */
export class UnsubscribeToken extends Model<
  InferAttributes<UnsubscribeToken>,
  InferCreationAttributes<UnsubscribeToken>
> {
  declare tokenHash: string;
  declare personId: string;
  declare shopId: string;
  declare createdAt: Date;
}

export function initUnsubscribeToken(sequelize: Sequelize): void {
  UnsubscribeToken.init(
    {
      tokenHash: { type: DataTypes.TEXT, primaryKey: true },
      personId: DataTypes.UUID,
      shopId: DataTypes.UUID,
      createdAt: DataTypes.DATE,
    },
    { sequelize, tableName: "unsubscribe_tokens" },
  );
}
