import { useMutation, useQueryClient } from "@tanstack/react-query";
import { changeMailChoices, type MailChoices, unsubscribe } from "#shared/contracts/mail-choices.ts";
import { call } from "@/lib/api-client.ts";
import { mailChoicesQuery, unsubscribeQuery } from "./queries.ts";

export function useChangeMailChoices() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ shop, ...body }: Partial<MailChoices> & Pick<MailChoices, "shop">) =>
      call(changeMailChoices, { params: { shop }, body: { notes: body.notes, reminders: body.reminders } }),
    onSuccess: () => client.invalidateQueries({ queryKey: mailChoicesQuery.queryKey }),
  });
}

export function useUnsubscribe() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (token: string) => call(unsubscribe, { params: { token } }),
    onSuccess: (_, token) =>
      Promise.all([
        client.invalidateQueries({ queryKey: unsubscribeQuery(token).queryKey }),
        client.invalidateQueries({ queryKey: mailChoicesQuery.queryKey }),
      ]),
  });
}
