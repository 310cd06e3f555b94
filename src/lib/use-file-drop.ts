import { type DragEvent, useState } from "react";

/** Handlers for an area that files are dropped on, and whether some are held over it now. */
export function useFileDrop(onFiles: (files: readonly File[]) => void) {
  const [over, setOver] = useState(false);
  const holdsFiles = (event: DragEvent) => event.dataTransfer.types.includes("Files");
  return {
    over,
    handlers: {
      onDragOver: (event: DragEvent) => {
        if (!holdsFiles(event)) return;
        event.preventDefault();
        setOver(true);
      },
      onDragLeave: (event: DragEvent<HTMLElement>) => {
        // Passing from one thing inside to the next is no leaving.
        if (event.relatedTarget instanceof Node && event.currentTarget.contains(event.relatedTarget)) return;
        setOver(false);
      },
      onDrop: (event: DragEvent) => {
        if (!holdsFiles(event)) return;
        event.preventDefault();
        setOver(false);
        if (event.dataTransfer.files.length > 0) onFiles([...event.dataTransfer.files]);
      },
    },
  };
}
