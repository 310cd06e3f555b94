import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";
import type { NoteState } from "#shared/lifecycle/note-states.ts";

/** What a mail says. The words are made when it is sent, from the rows its data names. */
export const mailKinds = [
  "sign in link",
  "invitation",
  "new password",
  "address changed",
  "proof issued",
  "revision asked",
  "approved",
  "notes gathered",
  "yes needed soon",
  "yes was needed",
] as const;
export type MailKind = (typeof mailKinds)[number];

/** One thing that happened to a note: it was left, answered, or brought from one state to another. */
export type NoteNews = {
  readonly noteId: string;
  /** The revision it was talked about on. */
  readonly revisionId: string;
  readonly what: "left" | "answered" | "moved";
  readonly replyId?: string;
  /** The state the note had before it was moved. */
  readonly from?: NoteState;
};

/** Ids of what the mail is about. Never a token: those are made when the mail is sent. */
export type MailData = {
  contactId?: string;
  invitationId?: string;
  personId?: string;
  revisionId?: string;
  news?: readonly NoteNews[];
  /** How many of the news its reader has seen on the sheet already. */
  seen?: number;
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
  /** Why it has not gone out: what the mail server said, or why it was dropped. */
  declare lastError: CreationOptional<string | null>;
  declare createdAt: Date;
  /** Not before then; null for at once. */
  declare dueAt: CreationOptional<Date | null>;
  /** When its words were made: from then on it gathers nothing more. */
  declare closedAt: CreationOptional<Date | null>;
  /** The refused mail that this one was sent in place of. */
  declare follows: CreationOptional<string | null>;
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
      dueAt: DataTypes.DATE,
      closedAt: DataTypes.DATE,
      follows: DataTypes.UUID,
      sentAt: DataTypes.DATE,
    },
    { sequelize, tableName: "outgoing_mails" },
  );
}
