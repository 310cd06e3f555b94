import type { Role } from "#shared/contracts/account.ts";
import { wrongState } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { teamPolicy } from "../policies/team.ts";
import { type LockedMember, lockMember } from "./lock-member.ts";
import { logEvent } from "./log-event.ts";

/** Changes what a member may do, from their next request on. The last owner stays owner. */
export async function changeMember(
  context: Context,
  { shopId, memberId, role }: { shopId: string; memberId: string; role: Role },
): Promise<LockedMember> {
  const { actor, transaction } = context;
  const locked = await lockMember(context, { shopId, memberId });
  const { member, person, owners } = locked;
  const from = member.role;
  if (from === role) return locked;
  if (!teamPolicy.changeRole(actor, { shopId, role: from, owners })) {
    throw wrongState("The shop needs an owner. Make someone else owner first.");
  }
  await member.update({ role }, { transaction });
  await logEvent(context, { shopId, kind: "role changed", data: { name: person.name, from, to: role } });
  return { ...locked, owners: owners + (role === "owner" ? 1 : 0) - (from === "owner" ? 1 : 0) };
}
