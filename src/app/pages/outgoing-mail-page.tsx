import { useSearchParams } from "react-router-dom";
import { TextLink } from "@/components/ui/text-link.tsx";
import { MailList } from "@/features/outgoing-mail/components/mail-list.tsx";
import { MailText } from "@/features/outgoing-mail/components/mail-text.tsx";
import { cx } from "@/lib/cx.ts";
import { useShop } from "@/lib/shop-context.ts";
import { NotFoundScreen } from "../not-found-screen.tsx";
import { Page } from "../page.tsx";

export function OutgoingMailPage() {
  const { slug, can } = useShop();
  const [search] = useSearchParams();
  const chosen = search.get("mail");
  if (!can.seeOutgoingMail) return <NotFoundScreen />;
  return (
    <Page
      title="Outgoing mail"
      under="No mail server is set up, so nothing leaves this machine: every mail is caught and stands here."
    >
      <div className="grid gap-8 lg:grid-cols-[minmax(0,1fr)_minmax(0,1.3fr)]">
        <div className={cx(chosen !== null && "hidden lg:block")}>
          <MailList shop={slug} chosen={chosen} />
        </div>
        {chosen === null ? (
          <p className="hidden text-base text-graphite lg:block">Choose a mail to read it and press its links.</p>
        ) : (
          <div>
            <p className="mb-3 lg:hidden">
              <TextLink to="?">All mail</TextLink>
            </p>
            <MailText shop={slug} mailId={chosen} />
          </div>
        )}
      </div>
    </Page>
  );
}
