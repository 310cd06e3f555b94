import { zodResolver } from "@hookform/resolvers/zod";
import { keepPreviousData, useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { openAnotherLike } from "#shared/contracts/another-like.ts";
import type { Job } from "#shared/contracts/jobs.ts";
import { Button } from "@/components/ui/button.tsx";
import { Checkbox } from "@/components/ui/checkbox.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { Select } from "@/components/ui/select.tsx";
import { TextArea } from "@/components/ui/text-area.tsx";
import { useSend } from "@/lib/use-send.ts";
import { useOpenAnotherLike } from "../api/mutations.ts";
import { clientChoicesQuery } from "../api/queries.ts";
import { ComesAlong } from "./comes-along.tsx";
import { dayHint } from "./day-hint.ts";

type AnotherLikeFormProps = {
  readonly shop: string;
  readonly job: Job;
  readonly onOpened: (jobId: string) => void;
};

/** For whom the next sign is, its words, and what of this one comes along. */
export function AnotherLikeForm({ shop, job, onOpened }: AnotherLikeFormProps) {
  const [q, setQ] = useState("");
  const clients = useQuery({ ...clientChoicesQuery(shop, q), placeholderData: keepPreviousData });
  const open = useOpenAnotherLike(shop, job.id);
  const form = useForm({
    resolver: zodResolver(openAnotherLike.body),
    defaultValues: { clientId: job.client.id, title: "", dueOn: null, words: "", artwork: false },
  });
  const clientId = form.watch("clientId");
  const sameClient = clientId === job.client.id;
  const artwork = sameClient && form.watch("artwork") === true;
  const others = clients.data?.items.filter(({ id }) => id !== job.client.id) ?? [];
  const isLong = q !== "" || (clients.data && clients.data.next !== null);
  const { problem, busy, handleSubmit } = useSend(
    form,
    ["clientId", "title", "dueOn", "words", "artwork"],
    async (values) => {
      const opened = await open.mutateAsync({ ...values, artwork: sameClient && values.artwork });
      onOpened(opened.id);
    },
  );
  const { errors } = form.formState;
  return (
    <form noValidate onSubmit={handleSubmit} className="space-y-4">
      {problem && <Notice tone="error">{problem}</Notice>}
      {isLong && (
        <Field
          label="Find another client"
          hint="The list below is long; a part of the name shortens it."
          type="search"
          value={q}
          onChange={(event) => setQ(event.target.value)}
        />
      )}
      <Select
        label="For whom"
        error={errors.clientId?.message ?? (clients.isError ? "Other clients could not be loaded." : undefined)}
        {...form.register("clientId")}
      >
        <option value={job.client.id}>{job.client.name}, as this one</option>
        {others.map((client) => (
          <option key={client.id} value={client.id}>
            {client.name}
          </option>
        ))}
      </Select>
      <Field
        label="What the sign is"
        hint="As “Back door sign, rings and planets”."
        autoComplete="off"
        error={errors.title?.message}
        {...form.register("title")}
      />
      <TextArea
        label="The words exactly as they shall read"
        hint="A line a line. They can be filled in later."
        error={errors.words?.message}
        {...form.register("words")}
      />
      <Field
        label="Due on"
        hint={dayHint(form.watch("dueOn") ?? null, "The hard date, if there is one.")}
        type="date"
        error={errors.dueOn?.message}
        {...form.register("dueOn", { setValueAs: (text: string | null) => (text === "" ? null : text) })}
      />
      {sameClient && (
        <Checkbox
          label="Take the artwork along"
          hint="Its pieces, margin plates and what was joined or cut from it."
          {...form.register("artwork")}
        />
      )}
      <ComesAlong sameClient={sameClient} artwork={artwork} client={job.client.name} />
      <Button type="submit" kind="primary" busy={busy}>
        Open the job
      </Button>
    </form>
  );
}
