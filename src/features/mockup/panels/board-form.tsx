import { type FormEvent, type ReactNode, type Ref, useEffect, useRef } from "react";
import { Button } from "@/components/ui/button.tsx";
import { useBoardDraft } from "../editor/use-board-draft.ts";
import { BoardBacker } from "./board-backer.tsx";
import { BoardFrame } from "./board-frame.tsx";
import { BoardHanging } from "./board-hanging.tsx";
import { BoardOutline } from "./board-outline.tsx";
import { BoardShowing } from "./board-showing.tsx";
import { CoatsEditor } from "./coats-editor.tsx";

export type BoardPart = "finish";

type BoardFormProps = {
  /** Where the reader begins; at the top when not said. */
  readonly at?: BoardPart;
  readonly onChanged: (changed: boolean) => void;
  readonly onLeave: () => void;
  readonly onTaken: () => void;
};

/** Outline, backer, frame, finish and hanging of the board, and the light it is shown in. One step for all of it. */
export function BoardForm({ at, onChanged, onLeave, onTaken }: BoardFormProps) {
  const writing = useBoardDraft();
  const { draft, set, isChanged } = writing;
  const form = useRef<HTMLFormElement>(null);
  const finish = useRef<HTMLHeadingElement>(null);
  useEffect(() => onChanged(isChanged), [onChanged, isChanged]);
  useEffect(() => {
    if (at !== "finish") return;
    // After the dialog has taken the focus, and has noted who is to get it back.
    const frame = requestAnimationFrame(() => {
      finish.current?.focus();
      finish.current?.scrollIntoView?.({ block: "start" });
    });
    return () => cancelAnimationFrame(frame);
  }, [at]);

  function handleSubmit(event: FormEvent) {
    event.preventDefault();
    if (writing.take()) onTaken();
    // The fields say what is wrong with them once they are drawn again.
    else requestAnimationFrame(() => form.current?.querySelector<HTMLElement>("[aria-invalid=true]")?.focus());
  }

  return (
    <form ref={form} noValidate className="space-y-6" onSubmit={handleSubmit}>
      <Part title="Size and outline">
        <BoardOutline writing={writing} />
      </Part>
      <Part title="Backer">
        <BoardBacker writing={writing} />
      </Part>
      <Part title="Frame">
        <BoardFrame writing={writing} />
      </Part>
      <Part title="Finish" heading={finish}>
        <CoatsEditor writing={writing} />
      </Part>
      <Part title="Hanging">
        <BoardHanging writing={writing} />
      </Part>
      <Part title="How it is shown">
        <BoardShowing draft={draft} set={set} problemOf={writing.problemOf} />
      </Part>
      <div className="sticky -bottom-5 -mx-5 flex flex-wrap items-center justify-end gap-3 border-t border-rule bg-sheet px-5 py-3 sm:-bottom-6 sm:-mx-6 sm:px-6">
        <Button onClick={onLeave}>Cancel</Button>
        <Button type="submit">Change the board</Button>
      </div>
    </form>
  );
}

function Part({
  title,
  heading,
  children,
}: {
  readonly title: string;
  readonly heading?: Ref<HTMLHeadingElement>;
  readonly children: ReactNode;
}) {
  return (
    <section aria-label={title}>
      <h3
        ref={heading}
        tabIndex={-1}
        className="scroll-mt-2 border-b border-rule pb-1 font-serif text-base font-bold text-ink"
      >
        {title}
      </h3>
      <div className="space-y-3 pt-3">{children}</div>
    </section>
  );
}
