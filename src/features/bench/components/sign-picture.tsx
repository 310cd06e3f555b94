import { useState } from "react";
import { getPicture } from "#shared/contracts/revisions.ts";
import { addressOf } from "@/lib/api-client.ts";
import { BoardMark } from "./board-mark.tsx";

/** The newest revision's sign, small; a drawn board while there is no picture. What it shows is said beside it. */
export function SignPicture({
  shop,
  revisionId,
  name,
}: {
  readonly shop: string;
  readonly revisionId: string | null;
  readonly name: string;
}) {
  const [missing, setMissing] = useState(false);
  if (revisionId === null || missing) return <BoardMark name={name} />;
  return (
    <img
      src={addressOf(getPicture, { params: { shop, revisionId } })}
      alt=""
      loading="lazy"
      width={104}
      height={66}
      className="h-[66px] w-[104px] shrink-0 bg-linen object-contain"
      onError={() => setMissing(true)}
    />
  );
}
