import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { z } from "zod";
import { type NamedDraft, renameDraft } from "#shared/contracts/named-drafts.ts";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { useSend } from "@/lib/use-send.ts";
import { useRenameDraft } from "../api/draft-requests.ts";
import type { DraftsOf } from "./drafts-dialog.tsx";

type RenameDraftFormProps = DraftsOf & { readonly draft: NamedDraft; readonly onDone: () => void };

const nameForm = z.object({ name: renameDraft.body.shape.name });

export function RenameDraftForm({ draft, onDone, shop, jobId }: RenameDraftFormProps) {
  const rename = useRenameDraft({ shop, jobId }, draft.id);
  const form = useForm({ resolver: zodResolver(nameForm), defaultValues: { name: draft.name } });
  const { problem, busy, handleSubmit } = useSend(form, ["name"], async ({ name }) => {
    await rename.mutateAsync(name);
    onDone();
  });
  return (
    <form noValidate onSubmit={handleSubmit} className="space-y-2">
      {problem && <Notice tone="error">{problem}</Notice>}
      <Field
        label={`New name of “${draft.name}”`}
        autoComplete="off"
        autoFocus
        maxLength={80}
        error={form.formState.errors.name?.message}
        {...form.register("name")}
      />
      <div className="flex gap-3">
        <Button type="submit" size="small" busy={busy}>
          Rename
        </Button>
        <Button size="small" onClick={onDone}>
          Leave it
        </Button>
      </div>
    </form>
  );
}
