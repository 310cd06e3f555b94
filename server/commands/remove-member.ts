import { wrongState } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { teamPolicy } from "../policies/team.ts";
import { endSessionsWithoutPlace } from "./end-sessions.ts";
import { lockMember } from "./lock-member.ts";
import { logEvent } from "./log-event.ts";

/** Ends a membership, and with it all its holder could do in the shop, at once. The last owner stays. */
export async function removeMember(
  context: Context,
  { shopId, memberId }: { shopId: string; memberId: string },
): Promise<void> {
  const { actor, now, transaction } = context;
  const { member, person, owners } = await lockMember(context, { shopId, memberId });
  if (!teamPolicy.remove(actor, { shopId, role: member.role, owners })) {
    throw wrongState("The shop needs an owner. Make someone else owner first.");
  }
  await member.update({ endedAt: now }, { transaction });
  await endSessionsWithoutPlace(context, person.id);
  await logEvent(context, { shopId, kind: "member removed", data: { name: person.name } });
}
