import { useEffect, useRef, useState } from "react";
import { messageOf } from "@/lib/form-problem.ts";
import { useAddArtwork } from "../api/mutations.ts";

export type Refusal = { readonly id: number; readonly name: string; readonly reason: string };

export type UploadState =
  | { readonly step: "idle" }
  | { readonly step: "sending"; readonly name: string; readonly share: number }
  | { readonly step: "cancelled"; readonly name: string };

/** Sends files one after another, with their progress and a way to give them up. Leaving the page gives them up too. */
export function useUpload(shop: string, jobId: string) {
  const [state, setState] = useState<UploadState>({ step: "idle" });
  const [refusals, setRefusals] = useState<readonly Refusal[]>([]);
  const controller = useRef<AbortController | null>(null);
  const add = useAddArtwork(shop, jobId);
  useEffect(() => () => controller.current?.abort(), []);

  /** Whether it was not given up. */
  const sendOne = async (file: File, own: AbortController): Promise<boolean> => {
    setState({ step: "sending", name: file.name, share: 0 });
    try {
      await add.mutateAsync({
        file,
        signal: own.signal,
        onProgress: (share) => setState({ step: "sending", name: file.name, share }),
      });
    } catch (error) {
      if (own.signal.aborted) {
        setState({ step: "cancelled", name: file.name });
        return false;
      }
      setRefusals((before) => [...before, { id: before.length, name: file.name, reason: messageOf(error) }]);
    }
    return true;
  };

  const send = async (files: readonly File[]) => {
    const own = new AbortController();
    controller.current = own;
    setRefusals([]);
    for (const file of files) if (!(await sendOne(file, own))) return;
    setState({ step: "idle" });
  };
  return { state, refusals, send, cancel: () => controller.current?.abort() };
}
