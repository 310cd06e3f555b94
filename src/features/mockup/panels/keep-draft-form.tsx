import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { z } from "zod";
import { keepDraft } from "#shared/contracts/named-drafts.ts";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { useSend } from "@/lib/use-send.ts";
import { useKeepDraft } from "../api/draft-requests.ts";
import type { DraftsOf } from "./drafts-dialog.tsx";

const nameForm = z.object({ name: keepDraft.body.shape.name });

/** Keeps what is on the desk under a name. */
export function KeepDraftForm({ shop, jobId, document }: DraftsOf) {
  const keep = useKeepDraft({ shop, jobId });
  const [kept, setKept] = useState<string | null>(null);
  const form = useForm({ resolver: zodResolver(nameForm), defaultValues: { name: "" } });
  const { problem, busy, handleSubmit } = useSend(form, ["name"], async ({ name }) => {
    setKept(null);
    const draft = await keep.mutateAsync({ name, document });
    form.reset();
    setKept(draft.name);
  });
  return (
    <form noValidate onSubmit={handleSubmit} className="space-y-3">
      {problem && <Notice tone="error">{problem}</Notice>}
      <div className="flex flex-wrap items-start gap-3">
        <div className="min-w-56 flex-1">
          <Field
            label="Name of the draft"
            hint="As “Narrow rings” or “Before the second row”."
            autoComplete="off"
            maxLength={80}
            error={form.formState.errors.name?.message}
            {...form.register("name")}
          />
        </div>
        <Button type="submit" busy={busy} className="sm:mt-6">
          Keep as a draft
        </Button>
      </div>
      <p role="status" className="text-sm text-verdigris empty:hidden">
        {kept !== null && `“${kept}” is kept.`}
      </p>
    </form>
  );
}
