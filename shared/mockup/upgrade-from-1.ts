import { leastBoardMm } from "./schema-parts.ts";
import type { UpgradeStep } from "./upgrade.ts";

type Json = Readonly<Record<string, unknown>>;

/**
 * From version 1: one kind of board and hardware, a finish in words, movement by hardness alone. What version 1 did not
 * say is set so that nothing drawn changes; a finish in words stays as it was written.
 */
export const upgradeFrom1: UpgradeStep = (old) => {
  const board = recordOf(old.board);
  const backer = recordOf(old.backer);
  const hanging = recordOf(old.hanging);
  const finish = typeof backer.finish === "string" ? backer.finish.trim() : "";
  return {
    ...old,
    board: { ...board, width: boardSide(board.width), height: boardSide(board.height), outline: { kind: "rectangle" } },
    hanging: { ...hanging, pose: "upright", carriesKg: null, points: [] },
    backer: {
      ...backer,
      stock: upgradeWood(recordOf(backer.stock)),
      // Version 1 drew the grain along the longer side.
      grainTurn: Number(board.height) > Number(board.width) ? 90 : 0,
      finish: finish === "" ? [] : [{ kind: "other", name: finish.slice(0, 120), dryingHours: 0 }],
    },
    layers: listOf(old.layers).map((layer) => ({
      ...layer,
      hold: upgradeHold(recordOf(layer.hold)),
      marked: "not stated",
      pieces: listOf(layer.pieces).map((piece) => ({ ...piece, reads: "" })),
    })),
  };
};

/** Version 1 took boards of any size; one too small to mean anything becomes the least there is. */
const boardSide = (side: unknown): unknown => (typeof side === "number" ? Math.max(leastBoardMm, side) : side);

/** Version 1 took the most of the usual softwoods and hardwoods, flatsawn (Wood Handbook, table 13-5). */
export function upgradeWood(wood: Json): Json {
  return { ...wood, movementPerPoint: wood.hardness === "softwood" ? 0.00267 : 0.00369 };
}

/** Version 1 had flat-head screws only, and their number in their name alone. */
export function upgradeHardware(hardware: Json): Json {
  const screw = recordOf(hardware.screw);
  const number = typeof screw.name === "string" ? /^No\. (\d{1,2})\b/.exec(screw.name)?.[1] : undefined;
  return { ...hardware, screw: { ...screw, gauge: number === undefined ? null : Number(number), head: "flat" } };
}

function upgradeHold(hold: Json): Json {
  switch (hold.kind) {
    case "bond":
      return { ...hold, tack: null };
    case "pocket":
      return { ...hold, cut: "engraved", bitRadius: 0 };
    case "standoff":
      return { ...hold, hardware: upgradeHardware(recordOf(hold.hardware)) };
    default:
      return hold;
  }
}

function recordOf(value: unknown): Json {
  return typeof value === "object" && value !== null && !Array.isArray(value) ? { ...value } : {};
}

function listOf(value: unknown): Json[] {
  return Array.isArray(value) ? value.map(recordOf) : [];
}
