/** Keys that do the same everywhere in a group, as they are lettered, and what they do. */
export type DeskKey = { readonly keys: string; readonly does: string };
export type DeskKeys = { readonly where: string; readonly keys: readonly DeskKey[] };

/** Every key of the desk, by where the focus is. What stands here is pressed by a test. */
export const deskKeys: readonly DeskKeys[] = [
  {
    where: "On the drawing",
    keys: [
      {
        keys: "Arrows",
        does: "move what is chosen by the step that the bar names; with nothing chosen they look around",
      },
      { keys: "Shift Arrows", does: "move it ten times as far" },
      { keys: "Delete, Backspace", does: "removes the chosen pieces or hole" },
      { keys: "Ctrl A", does: "chooses every piece that is shown and not locked" },
      { keys: "Escape", does: "lets go: of what is dragged, of putting holes, of what is chosen" },
      { keys: "+, −", does: "look closer and farther" },
      { keys: "0", does: "the whole board" },
      { keys: "9", does: "what is chosen, as close as it fits" },
    ],
  },
  {
    where: "Anywhere but in a field",
    keys: [
      { keys: "Ctrl C", does: "copies what is chosen, for every job of this client" },
      { keys: "Ctrl X", does: "copies it and takes it out" },
      { keys: "Ctrl V", does: "pastes: whole layers as layers, single pieces into the chosen layer" },
      { keys: "Ctrl Shift V", does: "pastes as layers of their own" },
      { keys: "Ctrl D", does: "doubles the chosen pieces in their place" },
      { keys: "Ctrl Z", does: "undo" },
      { keys: "Ctrl Shift Z, Ctrl Y", does: "redo" },
    ],
  },
  {
    where: "Anywhere on the desk",
    keys: [
      {
        keys: "F6, Shift F6",
        does: "to the next part and back: head, tools, drawing, section, place, schedule, pieces, dry fit",
      },
    ],
  },
  {
    where: "On a layer in the section",
    keys: [
      { keys: "Arrows", does: "raise it from barrel to barrel, or let it in step by step" },
      { keys: "Shift Arrows", does: "raise it by half a millimetre" },
    ],
  },
  {
    where: "In a cell of a list",
    keys: [
      { keys: "Enter", does: "takes what was typed" },
      { keys: "Escape", does: "puts back what was there" },
    ],
  },
  {
    where: "With the pointer",
    keys: [
      {
        keys: "Drag on bare ground",
        does: "draws a box that chooses what lies wholly in it; with Ctrl it can begin on a piece",
      },
      { keys: "Space and drag", does: "looks around, as the middle button, two fingers and “Look around” do" },
      { keys: "Wheel", does: "looks closer and farther, where the pointer is, as two fingers do" },
      { keys: "Shift and press", does: "adds to what is chosen, on the drawing and in the list of pieces" },
      { keys: "Press twice", does: "picks one piece out of its layer" },
      { keys: "Alt while dragging", does: "catches on nothing" },
    ],
  },
];
