type ViewHeadingProps = {
  readonly trade: string;
  /** The same in plain words, for a reader who is not of the trade. */
  readonly plain?: string | false;
  readonly after?: string;
};

/** The name of a view on the sheet. */
export function ViewHeading({ trade, plain = false, after }: ViewHeadingProps) {
  return (
    <h2 className="font-serif text-base font-bold">
      {trade}{" "}
      <span className="font-sans text-fine font-normal text-graphite">
        {plain && `(${plain})`}
        {plain && after && " "}
        {after}
      </span>
    </h2>
  );
}
