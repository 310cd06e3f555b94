import { useQuery } from "@tanstack/react-query";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { useSendMailAgain } from "../api/mutations.ts";
import { refusedMailsQuery } from "../api/queries.ts";
import { mailName } from "./mail-words.ts";

/** What nobody got: each refused mail with the mail server's words, to be sent again once the address is right. */
export function RefusedMails({ shop, jobId }: { readonly shop: string; readonly jobId: string }) {
  const refused = useQuery(refusedMailsQuery(shop, jobId));
  const again = useSendMailAgain(shop, jobId);
  // The job's page says on its own when it can't be loaded; this is a word on top of it.
  if (!refused.data || refused.data.items.length === 0) return null;
  return (
    <ul className="space-y-3" aria-label="Mail that was refused">
      {refused.data.items.map((mail) => (
        <li key={mail.id}>
          <Notice tone="error" title={`${mailName(mail)} to ${mail.to} was refused`}>
            <p className="[overflow-wrap:anywhere]">
              The mail server said: “{mail.reason}”. If the address is wrong, put it right first; it then goes to the
              new one.
            </p>
            {again.isError && again.variables === mail.id && <p className="mt-2">{messageOf(again.error)}</p>}
            <Button
              size="small"
              className="mt-3"
              aria-label={`Send again: ${mailName(mail)} to ${mail.to}`}
              busy={again.isPending && again.variables === mail.id}
              onClick={() => again.mutate(mail.id)}
            >
              Send again
            </Button>
          </Notice>
        </li>
      ))}
    </ul>
  );
}
