import type { Finding } from "#shared/dry-fit/finding.ts";

/** What a finding is about and of which layer, so that of several alike each can be told by its name: "Locate of B". */
export const titleAndLayer = ({ title, layerKey }: Pick<Finding, "title" | "layerKey">): string =>
  layerKey === null ? title : `${title} of ${layerKey}`;
