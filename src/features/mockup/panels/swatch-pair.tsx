/** Two colours edge to edge, as the eye compares them best. The words beside them say the rest. */
export function SwatchPair({ artwork, sheet }: { readonly artwork: string; readonly sheet: string | null }) {
  return (
    <svg aria-hidden="true" viewBox="0 0 36 18" className="h-5 w-10 shrink-0 text-graphite">
      <rect x="0.5" y="0.5" width="17.5" height="17" fill={artwork} />
      <rect x="18" y="0.5" width="17.5" height="17" fill={sheet ?? "transparent"} />
      <rect x="0.5" y="0.5" width="35" height="17" fill="none" stroke="currentColor" />
    </svg>
  );
}
