import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { changeJob, type Job } from "#shared/contracts/jobs.ts";
import { useSend } from "@/lib/use-send.ts";
import { useChangeJob } from "../api/mutations.ts";

const fields = [
  "title",
  "dueOn",
  "approverIds",
  "brief.words",
  "brief.widthMm",
  "brief.heightMm",
  "brief.place",
  "brief.walkway",
  "brief.overhead",
  "brief.electrical",
  "brief.wall",
  "brief.viewingDistanceMm",
  "brief.lighting",
  "brief.quantity",
  "brief.brandColours",
  "brief.about",
] as const;

/** The brief's form: starts from the job, sends only what was changed. */
export function useBriefForm(shop: string, job: Job) {
  const change = useChangeJob(shop, job.id);
  const form = useForm({
    resolver: zodResolver(changeJob.body),
    values: {
      title: job.title,
      dueOn: job.dueOn,
      approverIds: job.approvers.map((approver) => approver.contactId),
      brief: job.brief,
    },
    // A refreshed job fills the fields that nobody is writing in.
    resetOptions: { keepDirtyValues: true },
  });
  const dirty = form.formState.dirtyFields;
  const send = useSend(form, fields, async (values) => {
    const brief = Object.fromEntries(
      Object.entries(values.brief ?? {}).filter(([name]) => dirty.brief?.[name as keyof typeof dirty.brief]),
    );
    const saved = await change.mutateAsync({
      ...(dirty.title ? { title: values.title } : {}),
      ...(dirty.dueOn ? { dueOn: values.dueOn } : {}),
      ...(dirty.approverIds ? { approverIds: values.approverIds } : {}),
      ...(Object.keys(brief).length > 0 ? { brief } : {}),
    });
    form.reset({
      title: saved.title,
      dueOn: saved.dueOn,
      approverIds: saved.approvers.map((approver) => approver.contactId),
      brief: saved.brief,
    });
  });
  return { form, saved: change.isSuccess && !form.formState.isDirty, ...send };
}
