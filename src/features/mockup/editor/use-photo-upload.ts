import { useEffect, useRef, useState } from "react";
import type { WallPhotoItem } from "#shared/contracts/wall-photos.ts";
import { messageOf } from "@/lib/form-problem.ts";
import { useAddWallPhoto } from "../api/wall-photos.ts";

export type PhotoUpload =
  | { readonly step: "idle" }
  | { readonly step: "sending"; readonly name: string; readonly share: number }
  | { readonly step: "cancelled"; readonly name: string }
  | { readonly step: "refused"; readonly name: string; readonly reason: string };

/** Sends a photo of the wall, with its progress and a way to give it up. Leaving gives it up too. */
export function usePhotoUpload(shop: string, jobId: string, onAdded: (photo: WallPhotoItem) => void) {
  const [state, setState] = useState<PhotoUpload>({ step: "idle" });
  const controller = useRef<AbortController | null>(null);
  const add = useAddWallPhoto(shop, jobId);
  useEffect(() => () => controller.current?.abort(), []);

  const send = async (file: File): Promise<void> => {
    const own = new AbortController();
    controller.current = own;
    const { name } = file;
    setState({ step: "sending", name, share: 0 });
    try {
      const photo = await add.mutateAsync({
        file,
        signal: own.signal,
        onProgress: (share) => setState({ step: "sending", name, share }),
      });
      setState({ step: "idle" });
      onAdded(photo);
    } catch (error) {
      setState(own.signal.aborted ? { step: "cancelled", name } : { step: "refused", name, reason: messageOf(error) });
    }
  };
  return { state, send, cancel: () => controller.current?.abort() };
}
