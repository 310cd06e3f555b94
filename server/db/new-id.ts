import { randomUUID } from "node:crypto";

/** A key for a new row. */
export const newId = (): string => randomUUID();
