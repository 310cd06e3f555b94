type ComesAlongProps = {
  readonly sameClient: boolean;
  readonly artwork: boolean;
  /** Whose the earlier sign is. */
  readonly client: string;
};

/** What of a sign the next one like it begins with, and what stays where it is, in words. */
export function ComesAlong({ sameClient, artwork, client }: ComesAlongProps) {
  const along = [
    "Board, backer, slats, frame and hanging",
    "Layers with their sheet, thickness, hold and hardware; plain plates and the holes in them",
    "Of the brief: size, place, lighting, viewing distance and quantity",
    ...(sameClient ? ["What the client is about, and the brand’s colours"] : []),
    ...(artwork ? ["The artwork, its pieces and what was made of them, and a board cut to their outline"] : []),
  ];
  const stays = [
    artwork ? "Words and lettering" : "Words, lettering, artwork, and whatever follows their outlines",
    sameClient ? "Names that carry the old words" : "Names of layers and pieces",
    "The wall: its photo, its colour, and what its fixings carry",
    "Notes, revisions, drafts, approvers and the log",
    ...(sameClient ? [] : [`All else that ${client} gave: nothing of it leaves that client`]),
  ];
  return (
    <div className="grid gap-4 border-y border-rule py-4 sm:grid-cols-2" aria-live="polite">
      <List title="Comes along" items={along} />
      <List title="Stays here" items={stays} />
    </div>
  );
}

function List({ title, items }: { readonly title: string; readonly items: readonly string[] }) {
  return (
    <div>
      <p className="text-sm font-semibold text-ink">{title}</p>
      <ul className="mt-1 list-disc space-y-1 pl-5 text-sm text-ink">
        {items.map((item) => (
          <li key={item}>{item}</li>
        ))}
      </ul>
    </div>
  );
}
