import type { z } from "zod";
import type { invitationSchema, memberSchema } from "#shared/contracts/shop.ts";
import type { Invitation } from "../models/invitation.ts";
import type { Membership } from "../models/membership.ts";
import type { Person } from "../models/person.ts";
import type { Actor } from "../policies/actor.ts";
import { teamPolicy } from "../policies/team.ts";

export function presentMember(
  actor: Actor,
  { member, person, owners }: { member: Membership; person: Person; owners: number },
): z.input<typeof memberSchema> {
  const facts = { shopId: member.shopId, role: member.role, owners };
  return {
    id: member.id,
    name: person.name,
    email: person.email,
    role: member.role,
    since: member.createdAt.toISOString(),
    isYou: actor.kind === "staff" && actor.membershipId === member.id,
    can: { changeRole: teamPolicy.changeRole(actor, facts), remove: teamPolicy.remove(actor, facts) },
  };
}

export function presentInvitation(
  { id, email, role, createdAt }: Invitation,
  { by }: { by: string },
): z.input<typeof invitationSchema> {
  return { id, email, role, sentAt: createdAt.toISOString(), by };
}
