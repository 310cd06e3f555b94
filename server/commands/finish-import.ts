import { isDeepStrictEqual } from "node:util";
import type { TraceChoices } from "#shared/tracing/trace-choices.ts";
import type { ImportedFile } from "../artwork/import-bytes.ts";
import type { Context } from "../http/context.ts";
import { Artwork } from "../models/artwork.ts";
import { logSystemEvent } from "./log-event.ts";

/**
 * Writes down what an artwork became, or why it can't be taken. A picture that was traced again because of `asked` keeps what it was when
 * that failed. What nobody waits for any more changes nothing: an artwork imported before, a trace given up or asked for anew.
 */
export async function finishImport(
  context: Pick<Context, "transaction" | "now">,
  { artworkId, outcome, asked = null }: { artworkId: string; outcome: ImportedFile; asked?: TraceChoices | null },
): Promise<void> {
  const { transaction } = context;
  const row = await Artwork.findOne({ where: { id: artworkId }, transaction, lock: true });
  if (!row || (asked ? !isDeepStrictEqual(row.traceAsked, asked) : row.state !== "importing")) return;
  const of = { shopId: row.shopId, jobId: row.jobId };
  if (outcome.ok) {
    const { pieces, ...summary } = outcome.artwork;
    await row.update(
      {
        state: "ready",
        summary,
        pieces: JSON.stringify(pieces),
        refusal: null,
        trace: outcome.trace,
        traceAsked: null,
        traceFailure: null,
      },
      { transaction },
    );
    await logSystemEvent(context, { ...of, kind: "artwork ready", data: { name: row.name, pieces: pieces.length } });
  } else if (asked) {
    await row.update({ traceAsked: null, traceFailure: outcome.refusal }, { transaction });
  } else {
    await row.update({ state: "refused", refusal: outcome.refusal }, { transaction });
    await logSystemEvent(context, {
      ...of,
      kind: "artwork refused",
      data: { name: row.name, reason: outcome.refusal.text },
    });
  }
}
