import type { SetAside as SetAsideView } from "#shared/contracts/set-asides.ts";
import type { SetAside } from "../models/set-aside.ts";
import type { Actor } from "../policies/actor.ts";
import type { JobFacts } from "../policies/job.ts";
import { setAsidePolicy } from "../policies/set-aside.ts";

/** For staff only: no answer to a client or a guest carries one. */
export function presentSetAside(actor: Actor, on: JobFacts, row: SetAside): SetAsideView {
  return {
    id: row.id,
    finding: row.finding,
    reason: row.reason,
    by: row.setAsideName,
    at: row.setAsideAt.toISOString(),
    can: { takeBack: row.takenBackAt === null && setAsidePolicy.takeBack(actor, on) },
  };
}
