import { useState } from "react";
import { Button } from "@/components/ui/button.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";

/** The address of a link just made. It is shown this once, since only its hash is kept. */
export function MadeLink({ url, onDone }: { readonly url: string; readonly onDone: () => void }) {
  const [said, setSaid] = useState<string | null>(null);
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(url);
      setSaid("Copied.");
    } catch {
      setSaid("The browser did not allow copying. Mark the address and copy it yourself.");
    }
  };
  return (
    <Notice tone="done" title="The link is made. Copy it now: it can't be shown again." className="mb-6">
      <div className="mt-3 flex flex-wrap items-end gap-3">
        <Field
          label="Address of the link"
          className="min-w-0 flex-1 basis-64"
          readOnly
          value={url}
          onFocus={(event) => event.target.select()}
        />
        <Button kind="primary" onClick={() => void copy()}>
          Copy
        </Button>
        <Button onClick={onDone}>Done</Button>
      </div>
      {said && <p className="mt-2 text-sm">{said}</p>}
    </Notice>
  );
}
