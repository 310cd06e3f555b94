import { InvitationList } from "@/features/team/components/invitation-list.tsx";
import { InviteForm } from "@/features/team/components/invite-form.tsx";
import { MemberList } from "@/features/team/components/member-list.tsx";
import { useShop } from "@/lib/shop-context.ts";
import { NotFoundScreen } from "../not-found-screen.tsx";
import { Page } from "../page.tsx";

export function TeamPage() {
  const { slug, can } = useShop();
  if (!can.manageTeam) return <NotFoundScreen />;
  return (
    <Page title="Team">
      <div className="grid gap-10 lg:grid-cols-[minmax(0,1.5fr)_minmax(0,1fr)] lg:gap-14">
        <div className="space-y-10">
          <section aria-label="Members">
            <MemberList shop={slug} />
          </section>
          <section aria-labelledby="invitations">
            <h2 id="invitations" className="mb-3 font-serif text-lg font-bold">
              Invitations
            </h2>
            <InvitationList shop={slug} />
          </section>
        </div>
        <section aria-labelledby="invite">
          <h2 id="invite" className="mb-3 font-serif text-lg font-bold">
            Invite someone
          </h2>
          <InviteForm shop={slug} />
        </section>
      </div>
    </Page>
  );
}
