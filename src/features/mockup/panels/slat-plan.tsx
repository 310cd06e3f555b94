import { cx } from "@/lib/cx.ts";
import { DrawingSvg } from "@/lib/drawing-svg.tsx";
import { counted } from "@/lib/format.ts";
import type { BoardWriting } from "../editor/use-board-draft.ts";

/** The slats as they lie, numbered in the order they are laid, with the frame round them. */
export function SlatPlan({ writing }: { readonly writing: BoardWriting }) {
  const { laying, shown } = writing;
  if (laying.step === "failed")
    return (
      <p className="text-sm text-graphite">
        The picture of the slats could not be made. What you write is kept, and the dry fit checks it.
      </p>
    );
  if (!shown?.plan)
    return (
      <p className="border border-dashed border-rule px-3 py-10 text-center text-sm text-graphite">
        The slats show here as soon as they can be laid.
      </p>
    );
  return (
    <figure className="m-0" aria-busy={laying.step !== "laid"}>
      <DrawingSvg
        list={shown.plan}
        title={`${counted(shown.count, "slat")} as they lie on the board`}
        className={cx("block h-auto w-full", laying.step !== "laid" && "opacity-60")}
      />
      <figcaption className="pt-1 text-fine text-graphite">
        {counted(shown.count, "slat")}, numbered as they are laid.
      </figcaption>
    </figure>
  );
}
