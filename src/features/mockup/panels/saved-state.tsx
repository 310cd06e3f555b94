import { formatInstant } from "@/lib/format.ts";
import type { KeepFailure } from "../editor/use-draft-keeper.ts";
import type { Autosave } from "../model/autosave.ts";

type SavedStateProps = { readonly autosave: Autosave; readonly keepFailure: KeepFailure };

/** Where the work stands with the server, in words, and whether this browser keeps a copy meanwhile. */
export function SavedState({ autosave, keepFailure }: SavedStateProps) {
  const text = textOf(autosave, keepFailure);
  return (
    <p role="status" title={text} className="line-clamp-2">
      {text}
    </p>
  );
}

function textOf(autosave: Autosave, keepFailure: KeepFailure): string {
  const kept = keepFailure === null ? "Kept on this device" : noCopyWords(keepFailure);
  switch (autosave.state) {
    case "saved":
      if (autosave.savedAt === null) return "Nothing to save yet";
      return `Saved ${formatInstant(autosave.savedAt).replace("today ", "")}${and(keepFailure)}`;
    case "dirty":
    case "saving":
      return `Saving …${and(keepFailure)}`;
    case "stale":
      return `A newer version is there. ${kept}`;
    case "offline":
      return `No connection. ${kept}`;
    case "refused":
      return `Not saved. ${autosave.why} ${kept}`;
  }
}

/** Said also while all goes well, as soon as it is known: when the connection goes it is too late. */
const and = (failure: KeepFailure): string => (failure === null ? "" : `. ${noCopyWords(failure)}`);

const noCopyWords = (failure: NonNullable<KeepFailure>): string =>
  failure === "full" ? "No copy on this device: no room left" : "No copy: this browser keeps none";
