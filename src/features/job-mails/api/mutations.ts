import { useMutation, useQueryClient } from "@tanstack/react-query";
import { sendMailAgain } from "#shared/contracts/outgoing-mail.ts";
import { call } from "@/lib/api-client.ts";
import { keys } from "@/lib/query-keys.ts";

export function useSendMailAgain(shop: string, jobId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (mailId: string) => call(sendMailAgain, { params: { shop, jobId, mailId } }),
    // A mail that somebody else has sent again meanwhile is shown so, too.
    onSettled: () => client.invalidateQueries({ queryKey: keys.job(shop, jobId) }),
  });
}
