import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from "sequelize";

/** Which of the mails that nobody needs a person wants of a shop. Without a row they want all. */
export class MailChoices extends Model<InferAttributes<MailChoices>, InferCreationAttributes<MailChoices>> {
  declare personId: string;
  declare shopId: string;
  declare notes: boolean;
  declare reminders: boolean;
  declare changedAt: Date;
}

/** What can be stopped: gathered notes, and reminders of the day a yes is needed by. */
export type MailChoice = "notes" | "reminders";

export function initMailChoices(sequelize: Sequelize): void {
  MailChoices.init(
    {
      personId: { type: DataTypes.UUID, primaryKey: true },
      shopId: { type: DataTypes.UUID, primaryKey: true },
      notes: DataTypes.BOOLEAN,
      reminders: DataTypes.BOOLEAN,
      changedAt: DataTypes.DATE,
    },
    { sequelize, tableName: "mail_choices" },
  );
}
