import type { Job } from "#shared/contracts/jobs.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Notice } from "@/components/ui/notice.tsx";
import { BriefFacts } from "./brief-facts.tsx";
import { BriefForm } from "./brief-form.tsx";

/** The brief with what it lacks: a form for those who may change it, else to read. */
export function BriefPart(props: {
  readonly shop: string;
  readonly unit: LengthUnit;
  readonly job: Job;
  readonly side: "shop" | "client";
}) {
  const { job, unit } = props;
  return (
    <section id="brief" tabIndex={-1} aria-labelledby="brief-heading" className="scroll-mt-4">
      <h2 id="brief-heading" className="mb-3 font-serif text-lg font-bold">
        Brief
      </h2>
      {job.briefMissing.length > 0 && (
        <Notice tone="caution" title="The brief is not complete" className="mb-4">
          Still missing: {job.briefMissing.join(", ")}.
        </Notice>
      )}
      {job.can.editBrief ? <BriefForm {...props} /> : <BriefFacts job={job} unit={unit} />}
    </section>
  );
}
