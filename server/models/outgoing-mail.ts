import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";

/** What a mail says. The words are made when it is sent, from the rows its data names. */
export type MailKind =
  | "sign in link"
  | "proof issued"
  | "invitation"
  | "new password"
  | "address changed"
  | "revision asked"
  | "approved"
  | "note added"
  | "note answered";

/** Ids of what the mail is about. Never a token: those are made when the mail is sent. */
export type MailData = {
  contactId?: string;
  invitationId?: string;
  personId?: string;
  revisionId?: string;
  noteId?: string;
  replyId?: string;
};

export class OutgoingMail extends Model<InferAttributes<OutgoingMail>, InferCreationAttributes<OutgoingMail>> {
  declare id: string;
  declare shopId: CreationOptional<string | null>;
  declare jobId: CreationOptional<string | null>;
  declare kind: MailKind;
  declare recipientId: CreationOptional<string | null>;
  declare address: string;
  declare data: MailData;
  declare state: "queued" | "sent" | "refused" | "dropped";
  declare attempts: CreationOptional<number>;
  declare lastError: CreationOptional<string | null>;
  declare createdAt: Date;
  declare sentAt: CreationOptional<Date | null>;
}

export function initOutgoingMail(sequelize: Sequelize): void {
  OutgoingMail.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      jobId: DataTypes.UUID,
      kind: DataTypes.TEXT,
      recipientId: DataTypes.UUID,
      address: DataTypes.TEXT,
      data: DataTypes.JSONB,
      state: DataTypes.TEXT,
      attempts: { type: DataTypes.INTEGER, defaultValue: 0 },
      lastError: DataTypes.TEXT,
      createdAt: DataTypes.DATE,
      sentAt: DataTypes.DATE,
    },
    { sequelize, tableName: "outgoing_mails" },
  );
}
