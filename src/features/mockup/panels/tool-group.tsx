import type { ReactNode } from "react";

type ToolGroupProps = { readonly title: string; readonly children: ReactNode };

/** Words that do something, under the word that says what they are for. */
export function ToolGroup({ title, children }: ToolGroupProps) {
  return (
    <fieldset className="flex flex-wrap items-center gap-x-2">
      <legend className="float-left mr-2 text-sm font-semibold text-ink">{title}</legend>
      {children}
    </fieldset>
  );
}
