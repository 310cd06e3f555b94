import { useDesk } from "../editor/desk-context.ts";
import { isSame } from "../model/same.ts";
import { DraftsDialog } from "./drafts-dialog.tsx";

type DeskDraftsProps = {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  readonly shop: string;
  readonly jobId: string;
};

/** The drafts of the mockup on the desk. Going back to one is an edit like any other. */
export function DeskDrafts(props: DeskDraftsProps) {
  const { document, unit, edit } = useDesk();
  return (
    <DraftsDialog
      {...props}
      document={document}
      unit={unit}
      onGoBack={({ name, document: kept }) =>
        edit({ label: `Go back to the draft “${name}”`, change: (before) => (isSame(before, kept) ? before : kept) })
      }
    />
  );
}
