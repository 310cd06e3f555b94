import * as contract from "#shared/contracts/shop.ts";
import { changeMember } from "../commands/change-member.ts";
import { inviteMember, revokeInvitation } from "../commands/invite-member.ts";
import { removeMember } from "../commands/remove-member.ts";
import { notFound } from "../http/app-error.ts";
import { type ReadContext, shopIdOf } from "../http/context.ts";
import { type Routes, read, write } from "../http/route.ts";
import { isStaff, type Staff } from "../policies/actor.ts";
import { teamPolicy } from "../policies/team.ts";
import { presentInvitation, presentMember } from "../presenters/member.ts";
import { countOwners } from "../queries/count-owners.ts";
import { listInvitations } from "../queries/list-invitations.ts";
import { listMembers } from "../queries/list-members.ts";
import { pageOf } from "../queries/page.ts";

export function registerTeamRoutes(routes: Routes): void {
  read(routes, contract.listMembers, async (context, { query }) => {
    const { actor, transaction } = context;
    const { shopId } = seeTeam(context);
    const owners = await countOwners(shopId, transaction);
    const members = (await listMembers(context, query)).flatMap((member) =>
      member.person ? [{ member, person: member.person, owners }] : [],
    );
    const place = ({ member }: (typeof members)[number]) => [member.createdAt.toISOString(), member.id];
    return pageOf(members, query.limit, (member) => presentMember(actor, member), place);
  });

  write(routes, contract.changeMember, async (context, { params, body }) => {
    const { shopId } = seeTeam(context);
    return presentMember(context.actor, await changeMember(context, { shopId, memberId: params.memberId, ...body }));
  });

  write(routes, contract.removeMember, async (context, { params }) => {
    const { shopId } = seeTeam(context);
    await removeMember(context, { shopId, memberId: params.memberId });
    return undefined;
  });

  read(routes, contract.listInvitations, async (context, { query }) => {
    seeTeam(context);
    return pageOf(
      await listInvitations(context, query),
      query.limit,
      (invitation) => presentInvitation(invitation, { by: invitation.inviter?.name ?? "" }),
      ({ createdAt, id }) => [createdAt.toISOString(), id],
    );
  });

  write(routes, contract.inviteMember, async (context, { body }) => {
    const { shopId, personId, name } = seeTeam(context);
    return presentInvitation(await inviteMember(context, { shopId, personId, ...body }), { by: name });
  });

  write(routes, contract.revokeInvitation, async (context, { params }) => {
    const { shopId } = seeTeam(context);
    await revokeInvitation(context, { shopId, invitationId: params.invitationId });
    return undefined;
  });
}

/** The team is for owners; anyone else finds nothing here. */
function seeTeam(context: ReadContext): Staff {
  const { actor } = context;
  if (!isStaff(actor) || !teamPolicy.see(actor, { shopId: shopIdOf(context) })) throw notFound("page");
  return actor;
}
