import type { SetAside } from "#shared/contracts/set-asides.ts";
import type { Finding } from "#shared/dry-fit/finding.ts";
import { boundFinding } from "#shared/dry-fit/set-aside.ts";
import { messageOf } from "@/lib/form-problem.ts";
import { useSetAside, useTakeBack } from "../api/mutations.ts";

type Options = {
  readonly shop: string;
  readonly jobId: string;
  /** Saves what is on the desk and gives its version; null when it could not be saved. */
  readonly save: () => Promise<number | null>;
};

/** Sets findings aside and takes that back. Each gives what stood in the way, or null when it is done. */
export function useSettingAside({ shop, jobId, save }: Options) {
  const { mutateAsync: send } = useSetAside(shop, jobId);
  const { mutateAsync: takeBack } = useTakeBack(shop, jobId);
  return {
    async setAside(finding: Finding, reason: string): Promise<string | null> {
      const mockupVersion = await save();
      if (mockupVersion === null)
        return "The mockup could not be saved, so nothing was set aside. See beside Undo what stands in the way.";
      return outcomeOf(send({ mockupVersion, finding: boundFinding(finding), reason }));
    },
    takeBack: ({ id }: SetAside): Promise<string | null> => outcomeOf(takeBack(id)),
  };
}

export type SettingAside = ReturnType<typeof useSettingAside>;

const outcomeOf = (done: Promise<unknown>): Promise<string | null> => done.then(() => null, messageOf);
