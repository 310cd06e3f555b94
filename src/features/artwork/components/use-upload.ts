import { useEffect, useRef, useState } from "react";
import { messageOf } from "@/lib/form-problem.ts";
import { useAddArtwork } from "../api/mutations.ts";

export type UploadState =
  | { readonly step: "idle" }
  | { readonly step: "sending"; readonly name: string; readonly share: number }
  | { readonly step: "refused"; readonly name: string; readonly reason: string }
  | { readonly step: "cancelled"; readonly name: string };

/** Sends one file at a time, with its progress and a way to give it up. Leaving the page gives it up too. */
export function useUpload(shop: string, jobId: string) {
  const [state, setState] = useState<UploadState>({ step: "idle" });
  const controller = useRef<AbortController | null>(null);
  const add = useAddArtwork(shop, jobId);
  useEffect(() => () => controller.current?.abort(), []);

  const send = async (file: File) => {
    const own = new AbortController();
    controller.current = own;
    setState({ step: "sending", name: file.name, share: 0 });
    try {
      await add.mutateAsync({
        file,
        signal: own.signal,
        onProgress: (share) => setState({ step: "sending", name: file.name, share }),
      });
      setState({ step: "idle" });
    } catch (error) {
      setState(
        own.signal.aborted
          ? { step: "cancelled", name: file.name }
          : { step: "refused", name: file.name, reason: messageOf(error) },
      );
    }
  };
  return { state, send, cancel: () => controller.current?.abort() };
}
