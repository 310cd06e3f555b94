import { z } from "zod";

/** What a form says where the contract gives no words of its own. */
z.config({
  // The content policy forbids code made from text, and asking for it would be reported as a breach.
  jitless: true,
  customError: (issue) => {
    if (issue.code === "invalid_type")
      return issue.input === undefined || issue.input === null ? "Fill this in." : "This can't be read. Check it.";
    if (issue.code === "too_small")
      return issue.origin === "string"
        ? "Fill this in."
        : `${issue.inclusive ? "At least" : "Over"} ${String(issue.minimum)}.`;
    if (issue.code === "too_big")
      return `At most ${String(issue.maximum)}${issue.origin === "string" ? " characters" : ""}.`;
    if (issue.code === "invalid_format" || issue.code === "invalid_value") return "This can't be read. Check it.";
    return undefined;
  },
});
