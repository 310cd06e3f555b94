import { formatInstant } from "@/lib/format.ts";
import type { Autosave } from "../model/autosave.ts";

/** Where the work stands with the server, in words. */
export function SavedState({ autosave, keptHere }: { readonly autosave: Autosave; readonly keptHere: boolean }) {
  return (
    <p role="status" className="text-sm text-graphite">
      {textOf(autosave, keptHere)}
    </p>
  );
}

function textOf(autosave: Autosave, keptHere: boolean): string {
  switch (autosave.state) {
    case "saved":
      return autosave.savedAt === null
        ? "Nothing to save yet"
        : `Saved ${formatInstant(autosave.savedAt).replace("today ", "")}`;
    case "dirty":
    case "saving":
      return "Saving …";
    case "stale":
      return "Not saved: a newer version is there";
    case "offline":
      return keptHere ? "No connection. Kept on this device" : "No connection, and no room to keep it here";
    case "refused":
      return `Not saved. ${autosave.why}`;
  }
}
