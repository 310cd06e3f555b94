/** A step of the schema. Small, never edited once merged; `down` takes back exactly what `up` did. */
export type Migration = {
  readonly name: string;
  readonly up: (sql: (text: string) => Promise<void>) => Promise<void>;
  readonly down: (sql: (text: string) => Promise<void>) => Promise<void>;
};
