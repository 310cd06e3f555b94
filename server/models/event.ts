import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";

/** What happened. Its words are in presenters/event.ts. */
export type EventKind = keyof EventFacts;

/** What each kind of event carries besides who and when. */
export type EventFacts = {
  "shop opened": { name: string };
  "member invited": { email: string; role: string };
  "invitation taken back": { email: string };
  "member joined": { role: string };
  "member removed": { name: string };
  "role changed": { name: string; from: string; to: string };
  "shop changed": { fields: string[] };
  "limits changed": { changes: { limit: string; from: number; to: number }[] };
  "saws changed": { changes: { field: string; from: number; to: number }[] };
  /** Names of entries, no amounts: the log has more readers than the price book. */
  "prices changed": { entries: string[] };
  "stock added": { name: string };
  "stock changed": { name: string };
  "stock counted": { name: string; from: number | null; to: number | null };
  "stock taken out": { name: string };
  "stock brought back": { name: string };
  "usual stock added": { count: number };
  "client added": { name: string };
  "client changed": { name: string };
  "contact added": { name: string; email: string };
  "contact changed": { name: string };
  "contact address changed": { name: string; from: string; to: string };
  "contact removed": { name: string };
  "contact sent a link": { name: string };
  "job opened": { title: string };
  "job opened like another": { like: string; artwork: boolean };
  "job changed": { fields: string[] };
  "job moved": { from: string; to: string; reason: string };
  "consent given": Record<string, never>;
  "consent taken back": Record<string, never>;
  "artwork added": { name: string };
  "artwork ready": { name: string; pieces: number };
  "artwork refused": { name: string; reason: string };
  "artwork removed": { name: string };
  "wall photo added": { name: string };
  "wall photo removed": { name: string };
  "mockup begun": Record<string, never>;
  "draft kept": { name: string };
  "draft renamed": { from: string; to: string };
  "draft removed": { name: string };
  "finding set aside": { finding: string; reason: string };
  "set-aside taken back": { finding: string };
  "revision preparing": { letter: string };
  "revision issued": { letter: string };
  "revision failed": { letter: string; reason: string };
  "revision withdrawn": { letter: string; reason: string };
  "revision opened": { letter: string };
  "revision asked": { letter: string; summary: string };
  "revision approved": { letter: string; typedName: string };
  "certificate made": { letter: string };
  "note added": { number: number; letter: string };
  "note answered": { number: number };
  "note put right": { number: number };
  "note settled": { number: number };
  "note opened again": { number: number };
  "share link made": { label: string };
  "share link revoked": { label: string };
  "share link opened": { label: string };
  "mail sent": { kind: string; to: string };
  "mail refused": { kind: string; to: string; reason: string };
  "mail dropped": { kind: string; to: string; reason: string };
  "mail sent again": { kind: string; to: string };
  "signed in": { by: string };
};

export type EventData = EventFacts[EventKind];

export class Event extends Model<InferAttributes<Event>, InferCreationAttributes<Event>> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  declare jobId: CreationOptional<string | null>;
  declare at: Date;
  declare kind: EventKind;
  declare side: "shop" | "client" | "guest" | "system";
  declare personId: CreationOptional<string | null>;
  declare who: string;
  declare data: EventData;
}

export function initEvent(sequelize: Sequelize): void {
  Event.init(
    {
      id: { type: DataTypes.BIGINT, primaryKey: true, autoIncrement: true },
      shopId: DataTypes.UUID,
      jobId: DataTypes.UUID,
      at: DataTypes.DATE,
      kind: DataTypes.TEXT,
      side: DataTypes.TEXT,
      personId: DataTypes.UUID,
      who: DataTypes.TEXT,
      data: DataTypes.JSONB,
    },
    { sequelize, tableName: "events" },
  );
}
