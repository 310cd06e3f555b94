import type { DisplayList, DrawingSheet } from "../drawing/display-list.ts";
import type { Finding } from "../dry-fit/finding.ts";
import type { FrozenSetAside } from "../dry-fit/set-aside.ts";
import type { Figures } from "../stack/figures.ts";
import type { MockupDocument } from "./document.ts";

/** Changes when the engine computes or draws anything differently, so that a frozen drawing says what made it. */
export const engineVersion = "3";

/** What the sheet's lettering says beside the picture. Fields after ISO 7200. */
export type TitleBlock = {
  readonly owner: string;
  readonly client: string;
  readonly title: string;
  readonly number: string;
  readonly revision: string;
  /** Date of issue, YYYY-MM-DD. */
  readonly date: string;
  readonly createdBy: string;
  readonly documentType: string;
  readonly unit: "mm" | "in";
};

/** A note as it stood when the revision was issued. Shop-only notes never come here. */
export type FrozenNote = {
  readonly number: number;
  readonly kind: "must change" | "question" | "fine as is";
  readonly state: "open" | "answered" | "settled";
  readonly text: string;
  readonly author: string;
  readonly fromRevision: string;
  readonly zone: string | null;
};

/** Everything a revision freezes. Its hash is SHA-256 over its canonical JSON (RFC 8785), kept as text. */
export type Snapshot = {
  readonly engineVersion: string;
  readonly titleBlock: TitleBlock;
  readonly document: MockupDocument;
  readonly figures: Figures;
  readonly findings: readonly Finding[];
  /**
   * Which of them the shop had set aside, and why. Missing in what was frozen before there were any. It never leaves the
   * shop: what goes to a client says nothing of it.
   */
  readonly setAside?: readonly FrozenSetAside[];
  readonly notes: readonly FrozenNote[];
  /** Words as they shall read, from the brief. */
  readonly words: string;
  readonly drawing: {
    /** Front elevation with dimensions, 1:1 in mm of the sign. */
    readonly elevation: DisplayList;
    readonly section: DisplayList;
    /** The sign alone on its wall, without dimensions: for lists and the portfolio. */
    readonly picture: DisplayList;
    readonly sheets: readonly DrawingSheet[];
  };
  /** SHA-256 of each artwork used, by artwork id. */
  readonly artworkHashes: Readonly<Record<string, string>>;
  /** SHA-256 of the photo of the wall, by its id. Missing in what was frozen before there were any. */
  readonly photoHashes?: Readonly<Record<string, string>>;
  readonly fontHashes: Readonly<Record<string, string>>;
};
