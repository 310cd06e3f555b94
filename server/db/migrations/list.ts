import type { Migration } from "../migration.ts";
import { people } from "./2026-12-01-01-people.ts";
import { work } from "./2026-12-01-02-work.ts";
import { guards } from "./2026-12-01-03-guards.ts";
import { provenAddresses } from "./2026-12-01-04-proven-addresses.ts";
import { setAsides } from "./2026-12-01-05-set-asides.ts";
import { shopLimits } from "./2026-12-01-06-shop-limits.ts";
import { stock } from "./2026-12-01-07-stock.ts";
import { briefPlace } from "./2026-12-01-08-brief-place.ts";
import { priceBooks } from "./2026-12-01-09-price-books.ts";
import { shopSaws } from "./2026-12-01-10-shop-saws.ts";
import { artworkTracing } from "./2026-12-01-11-artwork-tracing.ts";
import { wallPhotos } from "./2026-12-01-12-wall-photos.ts";
import { namedDrafts } from "./2026-12-01-13-named-drafts.ts";
import { mockupStarts } from "./2026-12-01-14-mockup-starts.ts";
import { jobSignals } from "./2026-12-01-15-job-signals.ts";
import { noteEdits } from "./2026-12-01-16-note-edits.ts";
import { gatheredMail } from "./2026-12-01-17-gathered-mail.ts";
import { mailChoices } from "./2026-12-01-18-mail-choices.ts";
import { noteGuards } from "./2026-12-01-19-note-guards.ts";

/** Every migration in order. A new one goes to the end. */
export const migrations: readonly Migration[] = [
  people,
  work,
  guards,
  provenAddresses,
  setAsides,
  shopLimits,
  stock,
  briefPlace,
  priceBooks,
  shopSaws,
  artworkTracing,
  wallPhotos,
  namedDrafts,
  mockupStarts,
  jobSignals,
  noteEdits,
  gatheredMail,
  mailChoices,
  noteGuards,
];
