import { useState } from "react";
import type { Client } from "#shared/contracts/clients.ts";
import { Button } from "@/components/ui/button.tsx";
import { ConfirmDialog } from "@/components/ui/confirm-dialog.tsx";
import { Dialog } from "@/components/ui/dialog.tsx";
import { EmptyState } from "@/components/ui/empty-state.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { formatInstant } from "@/lib/format.ts";
import { useInviteContact, useRemoveContact } from "../api/mutations.ts";
import { AddContactForm } from "./add-contact-form.tsx";
import { ChangeContactForm } from "./change-contact-form.tsx";

type Contact = Client["contacts"][number];
type Open = { readonly what: "add" } | { readonly what: "change" | "remove"; readonly contact: Contact } | null;

/** Who speaks for a client: invite, change, remove, add. */
export function ContactList({ shop, client }: { readonly shop: string; readonly client: Client }) {
  const [open, setOpen] = useState<Open>(null);
  const [said, setSaid] = useState<string | null>(null);
  const invite = useInviteContact(shop);
  const remove = useRemoveContact(shop, client.id);
  const close = () => setOpen(null);
  const done = (words: string) => {
    setSaid(words);
    close();
  };
  const addButton = client.can.change && <Button onClick={() => setOpen({ what: "add" })}>Add a contact</Button>;
  return (
    <section aria-labelledby="contacts">
      <div className="mb-3 flex flex-wrap items-center justify-between gap-3">
        <h2 id="contacts" className="font-serif text-lg font-bold">
          Contacts
        </h2>
        {client.contacts.length > 0 && addButton}
      </div>
      {said && (
        <Notice tone="done" className="mb-3">
          {said}
        </Notice>
      )}
      {invite.isError && (
        <Notice tone="error" className="mb-3">
          {messageOf(invite.error)}
        </Notice>
      )}
      {client.contacts.length === 0 ? (
        <EmptyState title="Nobody speaks for this client yet" action={addButton}>
          Add who gets the proofs. Who may approve is chosen job by job.
        </EmptyState>
      ) : (
        <ul className="border-t border-rule">
          {client.contacts.map((contact) => (
            <li
              key={contact.id}
              className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2 border-b border-rule py-3"
            >
              <div className="min-w-0">
                <p className="font-semibold">{contact.name}</p>
                <p className="text-sm break-all text-graphite">{contact.email}</p>
                <p className="text-fine text-graphite">
                  {contact.lastSeenAt ? `last seen ${formatInstant(contact.lastSeenAt)}` : "has not been here yet"}
                </p>
              </div>
              {client.can.change && (
                <div className="flex flex-wrap gap-2">
                  <Button
                    size="small"
                    aria-label={`Mail ${contact.name} a sign-in link`}
                    busy={invite.isPending && invite.variables === contact.id}
                    onClick={() =>
                      invite.mutate(contact.id, {
                        onSuccess: () => setSaid(`A sign-in link is on its way to ${contact.email}.`),
                      })
                    }
                  >
                    Mail a sign-in link
                  </Button>
                  <Button
                    size="small"
                    aria-label={`Change ${contact.name}`}
                    onClick={() => setOpen({ what: "change", contact })}
                  >
                    Change
                  </Button>
                  <Button
                    size="small"
                    kind="danger"
                    aria-label={`Remove ${contact.name}`}
                    onClick={() => setOpen({ what: "remove", contact })}
                  >
                    Remove
                  </Button>
                </div>
              )}
            </li>
          ))}
        </ul>
      )}
      <Dialog open={open?.what === "add"} onOpenChange={close} title={`Add a contact of ${client.name}`}>
        <AddContactForm shop={shop} clientId={client.id} onAdded={(name) => done(`${name} is added.`)} />
      </Dialog>
      {open?.what === "change" && (
        <Dialog open onOpenChange={close} title={`Change ${open.contact.name}`}>
          <ChangeContactForm shop={shop} clientId={client.id} contact={open.contact} onChanged={done} />
        </Dialog>
      )}
      {open?.what === "remove" && (
        <ConfirmDialog
          open
          onOpenChange={close}
          title={`Remove ${open.contact.name}?`}
          action={`Remove ${open.contact.name}`}
          refuse={`Keep ${open.contact.name}`}
          busy={remove.isPending}
          error={remove.isError ? messageOf(remove.error) : null}
          onConfirm={() =>
            remove.mutate(open.contact.id, { onSuccess: () => done(`${open.contact.name} is removed.`) })
          }
        >
          <p>Access ends at once, and links already mailed open nothing. Notes and approvals stay as they are.</p>
        </ConfirmDialog>
      )}
    </section>
  );
}
