import { useQuery } from "@tanstack/react-query";
import { useMemo } from "react";
import type { SetAside } from "#shared/contracts/set-asides.ts";
import type { Finding } from "#shared/dry-fit/finding.ts";
import { matchSetAsides, type Standing } from "#shared/dry-fit/set-aside.ts";
import { mockupQueries } from "../api/queries.ts";

/** A finding on the desk and what stands against it. */
export type DeskStanding = Standing<Finding, SetAside>;

const none: readonly SetAside[] = [];

/**
 * The findings with what stands against each; null until both are known. While what is set aside can't be loaded every
 * finding stands, and `failure` says why.
 */
export function useStandings(
  { shop, jobId }: { readonly shop: string; readonly jobId: string },
  findings: readonly Finding[] | null,
) {
  const { data, isError, error, refetch } = useQuery(mockupQueries.setAsides(shop, jobId));
  const setAsides = data ?? (isError ? none : null);
  const standings = useMemo(
    (): readonly DeskStanding[] | null =>
      findings === null || setAsides === null ? null : matchSetAsides(findings, setAsides),
    [findings, setAsides],
  );
  return { standings, failure: data === undefined && isError ? error : null, retry: () => void refetch() };
}

export type Standings = ReturnType<typeof useStandings>;
