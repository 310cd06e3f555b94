import { TextLink } from "@/components/ui/text-link.tsx";
import { AidsTools } from "./aids-tools.tsx";
import { BringInTools } from "./bring-in-tools.tsx";
import { WordButton } from "./cell-controls.tsx";
import { CutTools } from "./cut-tools.tsx";
import type { DeskDialog } from "./desk-dialogs.tsx";
import { SetOutTools } from "./set-out-tools.tsx";

type DeskBarProps = {
  readonly client: string;
  readonly title: string;
  readonly jobPath: string;
  readonly cutPlanPath: string;
  readonly onOpen: (dialog: DeskDialog) => void;
};

/** What can be brought in, and how what is chosen is set out. */
export function DeskBar({ client, title, jobPath, cutPlanPath, onOpen }: DeskBarProps) {
  return (
    <section
      aria-label="Tools"
      data-desk-part
      className="flex flex-wrap items-center gap-x-5 gap-y-1 border-b border-rule px-4 py-1 sm:px-6"
    >
      <h1
        className="flex max-w-72 min-w-0 gap-1.5 font-sans text-sm text-ink min-[1600px]:max-w-2xl"
        title={`${client}, ${title}`}
      >
        <span className="shrink-0 font-semibold">Mockup of</span>
        <TextLink to={jobPath} className="truncate">
          {client}, {title}
        </TextLink>
      </h1>
      <BringInTools onOpen={onOpen} />
      <SetOutTools onOpen={onOpen} />
      <CutTools onOpen={onOpen} />
      <span className="ml-auto flex items-center gap-2">
        <AidsTools />
        <WordButton onClick={() => onOpen("wall")}>On the wall</WordButton>
        <WordButton onClick={() => onOpen("drafts")}>Drafts</WordButton>
        <TextLink to={cutPlanPath} className="text-sm">
          Cut plan
        </TextLink>
        <WordButton onClick={() => onOpen("board")}>Board</WordButton>
        <WordButton onClick={() => onOpen("keys")}>Keys</WordButton>
      </span>
    </section>
  );
}
