/** A chip of the material itself, as it is rather than as the page's palette has it. */
export function Swatch({ colour, kind }: { readonly colour: string; readonly kind: "sheet" | "wood" | "metal" }) {
  return (
    <svg aria-hidden="true" viewBox="0 0 40 28" className="h-7 w-10 shrink-0 border border-graphite">
      <rect width="40" height="28" fill={colour} />
      {kind === "wood" && (
        <path
          d="M0 6c12 4 26-4 40 1M0 14c14 3 24-4 40 0M0 22c10 3 26-3 40 1"
          fill="none"
          className="stroke-ink/30"
          strokeWidth="0.8"
        />
      )}
      {kind === "metal" && <circle cx="20" cy="14" r="9" fill="none" className="stroke-ink/50" strokeWidth="1" />}
    </svg>
  );
}
