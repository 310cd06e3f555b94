import type { Revision } from "#shared/contracts/revisions.ts";
import { Busy } from "@/components/ui/busy.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";

type UnreadySheetProps = {
  readonly revision: Revision;
  readonly jobPath: string;
  readonly mockupPath: string;
};

/** In the place of a sheet that is not out: being prepared, or returned to the draft. */
export function UnreadySheet({ revision, jobPath, mockupPath }: UnreadySheetProps) {
  return (
    <div className="mx-auto max-w-2xl space-y-5 px-4 py-10">
      {revision.state === "preparing" ? (
        <>
          <h1 className="font-serif text-2xl font-bold">Revision {revision.letter} is being prepared</h1>
          <p>
            Its drawing is frozen. Now the PDF is drawn, read back and stored; the mail to the client goes out after
            that. This page shows the sheet by itself as soon as it is there. You may leave: nothing stops.
          </p>
          <Busy label="Drawing the PDF" />
        </>
      ) : (
        <>
          <h1 className="font-serif text-2xl font-bold">Revision {revision.letter} is not out</h1>
          {revision.failure === null ? (
            <p>It is a draft still. Issue it from the mockup.</p>
          ) : (
            <Notice tone="error" title="The PDF could not be made.">
              <p>{revision.failure}</p>
              <p>No mail went out and nothing was lost: the mockup is as it was. Mend it there and issue again.</p>
            </Notice>
          )}
        </>
      )}
      <p className="flex gap-5">
        <TextLink to={jobPath}>To the job</TextLink>
        <TextLink to={mockupPath}>To the mockup</TextLink>
      </p>
    </div>
  );
}
