import type { ReactNode } from "react";
import type { Job } from "#shared/contracts/jobs.ts";
import { formatSize } from "#shared/units/format-length.ts";
import { inchesToMm, type LengthUnit } from "#shared/units/length.ts";

/** The brief to read, for those who may not change it. */
export function BriefFacts({ job, unit }: { readonly job: Job; readonly unit: LengthUnit }) {
  const { brief } = job;
  const facts: readonly (readonly [string, ReactNode])[] = [
    ["The words", brief.words && <span className="whitespace-pre-line">{brief.words}</span>],
    ["Size", brief.widthMm !== null && brief.heightMm !== null && formatSize(brief.widthMm, brief.heightMm, unit)],
    ["How many", String(brief.quantity)],
    ["Place", brief.place],
    ["The wall", brief.wall],
    [
      "Asks for care",
      [
        brief.walkway && "people walk past it within reach",
        brief.overhead && "hangs over where people stand or walk",
        brief.electrical && "has electrical parts",
      ]
        .filter(Boolean)
        .join("; "),
    ],
    [
      "Read from",
      brief.viewingDistanceMm !== null &&
        (unit === "mm"
          ? `${Number((brief.viewingDistanceMm / 1000).toFixed(2))} m`
          : `${Number((brief.viewingDistanceMm / inchesToMm(12)).toFixed(1))} feet`),
    ],
    ["Lighting", brief.lighting],
    ["Brand colours", brief.brandColours],
    ["About", brief.about],
    ["Who approves", job.approvers.map((approver) => approver.name).join(", ")],
  ];
  return (
    <dl className="grid gap-x-6 border-t border-rule sm:grid-cols-[10rem_minmax(0,1fr)]">
      {facts
        .filter(([, value]) => value)
        .map(([name, value]) => (
          <div key={name} className="contents">
            <dt className="pt-2.5 text-sm text-graphite sm:border-b sm:border-rule sm:pb-2.5">{name}</dt>
            <dd className="border-b border-rule pb-2.5 text-base sm:pt-2.5">{value}</dd>
          </div>
        ))}
    </dl>
  );
}
