import type { Finding } from "#shared/dry-fit/finding.ts";
import { titleAndLayer } from "../model/title-and-layer.ts";
import { WordButton } from "./cell-controls.tsx";

type ShowFindingProps = {
  readonly finding: Finding;
  /** Missing where there is nothing to show it on. */
  readonly onShow?: ((finding: Finding) => void) | undefined;
};

/** The way to the spot, for a finding that has one. */
export function ShowFinding({ finding, onShow }: ShowFindingProps) {
  if (!onShow || (finding.where === null && finding.layerKey === null)) return null;
  return (
    <WordButton inText aria-label={`Show: ${titleAndLayer(finding)}`} onClick={() => onShow(finding)}>
      Show
    </WordButton>
  );
}
