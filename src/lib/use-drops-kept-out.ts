import { useEffect } from "react";

/** A file dropped beside the frame would be opened in place of the page, and what is being written there would be gone. */
export function useDropsKeptOut(): void {
  useEffect(() => {
    const keepOut = (event: DragEvent) => {
      if (event.dataTransfer?.types.includes("Files")) event.preventDefault();
    };
    window.addEventListener("dragover", keepOut);
    window.addEventListener("drop", keepOut);
    return () => {
      window.removeEventListener("dragover", keepOut);
      window.removeEventListener("drop", keepOut);
    };
  }, []);
}
