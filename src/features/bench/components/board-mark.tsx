/** A small drawn board with initials and a dimension line, standing for a job without a picture. */
export function BoardMark({ name }: { readonly name: string }) {
  const initials = name
    .split(/[^\p{L}\p{N}]+/u)
    .filter(Boolean)
    .slice(0, 3)
    .map((word) => word.charAt(0).toUpperCase())
    .join("");
  return (
    <svg aria-hidden="true" viewBox="0 0 104 66" className="h-[66px] w-[104px] shrink-0 bg-linen text-graphite">
      <g fill="none" stroke="currentColor">
        <path d="M22 12h60M22 9v6M82 9v6" strokeWidth="0.75" />
        <rect x="22" y="20" width="60" height="36" className="fill-sheet" strokeWidth="1.5" />
      </g>
      <text x="52" y="44" textAnchor="middle" fontSize="17" letterSpacing="1" className="fill-ink font-serif font-bold">
        {initials}
      </text>
    </svg>
  );
}
