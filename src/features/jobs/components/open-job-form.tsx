import { zodResolver } from "@hookform/resolvers/zod";
import { keepPreviousData, useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { z } from "zod";
import { addClient } from "#shared/contracts/clients.ts";
import { openJob } from "#shared/contracts/jobs.ts";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Select } from "@/components/ui/select.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { useSend } from "@/lib/use-send.ts";
import { useOpenJob } from "../api/mutations.ts";
import { clientChoicesQuery } from "../api/queries.ts";
import { dayHint } from "./day-hint.ts";

const someoneNew = "new";

/** A chosen client or a new one's name, with title and day as the request wants them. */
const openJobForm = openJob.body
  .extend({ clientId: z.string().min(1, "Choose a client."), name: z.string() })
  .superRefine(({ clientId, name }, context) => {
    if (clientId !== someoneNew) return;
    for (const { message } of addClient.body.shape.name.safeParse(name).error?.issues ?? []) {
      context.addIssue({ code: "custom", path: ["name"], message });
    }
  });

export function OpenJobForm({ shop, onOpened }: { readonly shop: string; readonly onOpened: (jobId: string) => void }) {
  const [q, setQ] = useState("");
  const clients = useQuery({ ...clientChoicesQuery(shop, q), placeholderData: keepPreviousData });
  const open = useOpenJob(shop);
  const form = useForm({
    resolver: zodResolver(openJobForm),
    defaultValues: { clientId: "", name: "", title: "", dueOn: null },
  });
  const isNew = form.watch("clientId") === someoneNew;
  const { problem, busy, handleSubmit } = useSend(form, ["clientId", "name", "title", "dueOn"], async (values) => {
    const job = await open.mutateAsync({
      client: values.clientId === someoneNew ? { name: values.name } : { id: values.clientId },
      title: values.title,
      dueOn: values.dueOn,
    });
    onOpened(job.id);
  });
  const { errors } = form.formState;
  if (clients.isPending) return <Skeleton label="Loading the clients" rows={3} />;
  if (clients.isError) {
    return (
      <ProblemNotice
        what="The clients could not be loaded."
        error={clients.error}
        onRetry={() => void clients.refetch()}
      />
    );
  }
  return (
    <form noValidate onSubmit={handleSubmit} className="space-y-4">
      {problem && <Notice tone="error">{problem}</Notice>}
      {(q !== "" || clients.data.next !== null) && (
        <Field
          label="Find the client"
          hint="The list below is long; a part of the name shortens it."
          type="search"
          value={q}
          onChange={(event) => setQ(event.target.value)}
        />
      )}
      <Select label="Client" error={errors.clientId?.message} {...form.register("clientId")}>
        <option value="">Choose a client</option>
        <option value={someoneNew}>Someone new</option>
        {clients.data.items.map((client) => (
          <option key={client.id} value={client.id}>
            {client.name}
          </option>
        ))}
      </Select>
      {isNew && (
        <Field label="Name of the company" autoComplete="off" error={errors.name?.message} {...form.register("name")} />
      )}
      <Field
        label="What the sign is"
        hint="As “Lobby sign, rings and planets”."
        autoComplete="off"
        error={errors.title?.message}
        {...form.register("title")}
      />
      <Field
        label="Due on"
        hint={dayHint(form.watch("dueOn"), "The hard date, if there is one.")}
        type="date"
        error={errors.dueOn?.message}
        {...form.register("dueOn", { setValueAs: (text: string | null) => (text === "" ? null : text) })}
      />
      <Button type="submit" kind="primary" busy={busy}>
        Open the job
      </Button>
    </form>
  );
}
