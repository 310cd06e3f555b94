import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useEffect, useRef, useState } from "react";
import { type Artwork, addArtwork } from "#shared/contracts/artworks.ts";
import { messageOf } from "./form-problem.ts";
import { keys } from "./query-keys.ts";
import { upload } from "./upload.ts";

export type Refusal = { readonly id: number; readonly name: string; readonly reason: string };

export type UploadState =
  | { readonly step: "idle" }
  | { readonly step: "sending"; readonly name: string; readonly share: number }
  | { readonly step: "cancelled"; readonly name: string };

/**
 * Sends artwork files one after another, with their progress and a way to give them up. Leaving the page gives them up too.
 * `onTaken` hears of each that the server took, before it is turned into pieces.
 */
export function useArtworkUpload(shop: string, jobId: string, onTaken?: (artwork: Artwork) => void) {
  const [state, setState] = useState<UploadState>({ step: "idle" });
  const [refusals, setRefusals] = useState<readonly Refusal[]>([]);
  const controller = useRef<AbortController | null>(null);
  const client = useQueryClient();
  const add = useMutation({
    mutationFn: (sent: { file: File; signal: AbortSignal; onProgress: (share: number) => void }) =>
      upload(addArtwork, { params: { shop, jobId }, ...sent }),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.job(shop, jobId) }),
  });
  useEffect(() => () => controller.current?.abort(), []);

  /** Whether it was not given up. */
  const sendOne = async (file: File, own: AbortController): Promise<boolean> => {
    setState({ step: "sending", name: file.name, share: 0 });
    try {
      const taken = await add.mutateAsync({
        file,
        signal: own.signal,
        onProgress: (share) => setState({ step: "sending", name: file.name, share }),
      });
      onTaken?.(taken);
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
