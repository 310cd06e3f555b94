import { applyMend } from "#shared/dry-fit/apply-mend.ts";
import { listMends } from "#shared/dry-fit/list-mends.ts";
import type { Mend } from "#shared/dry-fit/mend.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Mends, Picture, PictureInput } from "./picture-messages.ts";

/** Worst first, so what is left without mends on a sign full of findings is the least of them. */
const mostMended = 60;

/**
 * What mends the findings of a picture, one finding after the other with a pause between, so that a newer question is
 * heard. Null as soon as `isOvertaken` says that there is one.
 */
export async function mendFindings(
  { document, context, limits }: PictureInput,
  { figures, drawing }: Picture,
  { kernel, isOvertaken, pause }: { kernel: Kernel; isOvertaken: () => boolean; pause: () => Promise<void> },
): Promise<Mends | null> {
  const mends: (readonly Mend[])[] = [];
  for (const finding of drawing?.dryFit.findings.slice(0, mostMended) ?? []) {
    await pause();
    if (isOvertaken()) return null;
    const listed = listMends(finding, { document, figures, limits, context, kernel });
    // What lies in a locked layer is mended once that is unlocked.
    mends.push(listed.filter((mend) => applyMend(document, mend) !== document));
  }
  return mends;
}
