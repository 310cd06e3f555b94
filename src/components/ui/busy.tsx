/** Work under way. With a share (0 to 1) it shows how far, without one that it goes on. */
export function Busy({ label, share }: { readonly label: string; readonly share?: number }) {
  const percent = share === undefined ? undefined : Math.round(share * 100);
  return (
    <div className="space-y-1.5">
      <p className="text-sm text-graphite">
        <span role="status">{label}</span>
        {/* Read out at each step it would drown everything else; the bar tells it to whoever asks. */}
        {percent !== undefined && (
          <span aria-hidden="true" className="tabular-nums">
            {" "}
            {percent} %
          </span>
        )}
      </p>
      <progress
        aria-label={label}
        max={1}
        {...(share === undefined ? {} : { value: share })}
        className="busy-bar block h-1.5 w-full"
      />
    </div>
  );
}
