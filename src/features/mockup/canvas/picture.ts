import { type Canvas, FabricObject, Shadow } from "fabric/es";
import type { CastShadow } from "../model/cast-shadows.ts";
import { movedTogether } from "../model/moved-together.ts";
import type { Shift } from "../model/shifts.ts";
import { FlatPicture } from "./flat-picture.ts";
import type { Painted } from "./paint-items.ts";

/** As dark as the shadows of the drawing are at their darkest. */
const castColour = "rgba(26, 18, 8, 0.46)";

type Shadows = ReadonlyMap<string, CastShadow> | null;
type Shifts = ReadonlyMap<string, Shift>;

/** An object with where the picture has it. */
type Placed = Painted & { readonly left: number; readonly top: number };

/** What a picture looked like when it was drawn last. */
type Drawn = {
  readonly placed: readonly Placed[];
  readonly shadows: Shadows;
  readonly look: string;
  readonly shifts: Shifts;
};

/**
 * The whole picture as one object. Drawn again with nothing or only one group of things moved, it is drawn from flattened
 * bitmaps: a hand that drags, and marks that change, then cost no more on a large sign than on a small one.
 */
export class Picture extends FabricObject {
  static override type = "Picture";
  #placed: readonly Placed[] = [];
  #shadows: Shadows = null;
  #shifts: Shifts = new Map();
  /** The shifts that the objects lie by. */
  #applied: Shifts = new Map();
  #drawn: Drawn | null = null;
  #flat: FlatPicture | null = null;

  constructor() {
    super({ selectable: false, evented: false, objectCaching: false });
  }

  /** Takes new objects, which lie where the picture has them; or some of those it had. */
  show(painted: readonly Painted[]): void {
    if (this.canvas) this.#apply(this.canvas as Canvas, new Map());
    this.#placed = painted.map((one) => ({ ...one, left: one.object.left, top: one.object.top }));
    this.#applied = new Map();
    this.#throwShadows();
  }

  shift(shifts: Shifts): void {
    this.#shifts = shifts;
  }

  lift(shadows: Shadows): void {
    if (shadows === this.#shadows) return;
    this.#shadows = shadows;
    this.#throwShadows();
  }

  override render(context: CanvasRenderingContext2D): void {
    const canvas = this.canvas as Canvas | undefined;
    if (!canvas) return;
    const before = this.#drawn;
    const now: Drawn = { placed: this.#placed, shadows: this.#shadows, look: lookOf(canvas), shifts: this.#shifts };
    this.#drawn = now;
    const sameLook = before?.placed === now.placed && before.look === now.look;
    const base = this.#flat?.base ?? before?.shifts;
    const moved = sameLook && base ? movedTogether(base, now.shifts) : null;
    if (!moved || !base) {
      this.#forgetFlat();
      this.#apply(canvas, now.shifts);
      for (const { object } of this.#placed) object.render(context);
      return;
    }
    const flat = this.#flat;
    const isFlat = flat !== null && before?.shadows === now.shadows && holds(flat.moving, moved.ids);
    if (!isFlat) {
      this.#forgetFlat();
      this.#apply(canvas, base);
      this.#flat = new FlatPicture(canvas, this.#placed, { base, moving: moved.ids });
    }
    this.#flat?.draw(context, moved.by);
  }

  override dispose(): void {
    this.#forgetFlat();
    for (const { object } of this.#placed) object.dispose();
    super.dispose();
  }

  #forgetFlat(): void {
    this.#flat?.free();
    this.#flat = null;
  }

  /** Pieces in the hand throw the canvas's own rough shadows in place of the picture's. */
  #throwShadows(): void {
    const shadows = this.#shadows;
    const first = new Set<string>();
    let isOnBoard = false;
    for (const { object, id, isShadow } of this.#placed) {
      // What the board throws on the wall stays: nothing on it moves the board.
      isOnBoard ||= id === "board";
      if (isShadow) object.visible = shadows === null || !isOnBoard;
      // Only a piece's body throws a shadow, which is the first of what carries its name.
      if (id === null || first.has(id)) continue;
      first.add(id);
      const cast = shadows?.get(id);
      object.shadow = cast
        ? new Shadow({ color: castColour, offsetX: cast.dx, offsetY: cast.dy, blur: cast.blur })
        : null;
    }
  }

  #apply(canvas: Canvas, shifts: Shifts): void {
    const isApplied = shifts === this.#applied;
    this.#applied = shifts;
    for (const { object, id, left, top } of this.#placed) {
      object.canvas = canvas;
      if (isApplied) continue;
      const by = id === null ? undefined : shifts.get(id.replace(/^hole:/, ""));
      object.set({ left: left + (by?.dx ?? 0), top: top + (by?.dy ?? 0) });
      object.setCoords();
    }
  }
}

/** Nothing of what can move has moved, or all of it. */
const holds = (moving: ReadonlySet<string>, moved: ReadonlySet<string>) =>
  moved.size === 0 || (moved.size === moving.size && [...moved].every((id) => moving.has(id)));

const lookOf = (canvas: Canvas) =>
  [...canvas.viewportTransform, canvas.width, canvas.height, canvas.getRetinaScaling()].join(" ");
