import { Menu, MenuItem } from "@/components/ui/menu.tsx";
import { useDesk } from "../editor/desk-context.ts";
import { centrePieces } from "../model/commands/pieces.ts";
import { ToolWord } from "./tool-word.tsx";

const ways = [
  { way: "both", words: "across and down" },
  { way: "across", words: "across" },
  { way: "down", words: "down" },
] as const;

/** The middle of what is chosen onto the middle of the board. */
export function CentreMenu({ why }: { readonly why: string | null }) {
  const { selection, edit } = useDesk();
  const { pieceIds } = selection;
  const label = "centre on board";
  if (why !== null) return <ToolWord why={why}>{label}</ToolWord>;
  return (
    <Menu align="start" trigger={<ToolWord why={null}>{label}</ToolWord>}>
      {ways.map(({ way, words }) => (
        <MenuItem
          key={way}
          onSelect={() =>
            edit({ label: `Centre ${words}`, change: (before) => centrePieces(before, { pieceIds, way }) })
          }
        >
          {words}
        </MenuItem>
      ))}
    </Menu>
  );
}
