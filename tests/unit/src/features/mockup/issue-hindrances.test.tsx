// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { expect, it } from "vitest";
import type { SetAside } from "#shared/contracts/set-asides.ts";
import type { Finding } from "#shared/dry-fit/finding.ts";
import { boundFinding } from "#shared/dry-fit/set-aside.ts";
import type { DeskStanding } from "@/features/mockup/editor/use-standings.ts";
import { IssueDialog } from "@/features/mockup/panels/issue-dialog.tsx";
import { button, render } from "../../support/render.tsx";

const thin: Finding = {
  rule: 3,
  title: "Thin stroke",
  severity: "stop",
  text: "Ring of C is 1.82 mm at its thinnest.",
  layerKey: "C",
  pieceIds: ["ring"],
  holeId: null,
  where: null,
  value: 1.82,
  limit: 2,
  unit: "mm",
  source: "common practice",
};
const grip: Finding = { ...thin, rule: 8, title: "Grip", text: "The cap of B never tightens." };
const aside: SetAside = {
  id: "00000000-0000-4000-8000-0000000000a1",
  finding: boundFinding(thin),
  reason: "Drawn so by the client",
  by: "Ada Maker",
  at: "2026-12-01T09:00:00.000Z",
  can: { takeBack: true },
};
const standing = (finding: Finding, setAside: SetAside | null = null): DeskStanding => ({
  finding,
  setAside,
  woken: null,
});

const show = (standings: readonly DeskStanding[]) =>
  render(
    <QueryClientProvider client={new QueryClient()}>
      <IssueDialog
        open
        onOpenChange={() => undefined}
        shop="copperlark-signs"
        jobId="00000000-0000-4000-8000-000000000007"
        letter="B"
        approvers={["Ida Client"]}
        differences={[]}
        standings={standings}
        save={async () => 4}
        onIssued={() => undefined}
      />
    </QueryClientProvider>,
  );
const says = (text: string) => document.querySelector('[role="dialog"]')?.textContent?.includes(text) ?? false;

it("names each stop in the way, and can't be sent", async () => {
  await show([standing(grip), standing({ ...thin, severity: "caution" })]);
  expect(says("1 stop in the way")).toBe(true);
  expect(says("The cap of B never tightens.")).toBe(true);
  expect(says("1.82 mm")).toBe(false);
  expect(button("Issue B").disabled).toBe(true);
});

it("says what is set aside, why and by whom, and who will not see it", async () => {
  await show([standing(thin, aside), standing({ ...grip, severity: "remark" })]);
  expect(says("1 finding set aside")).toBe(true);
  expect(says("Ring of C is 1.82 mm at its thinnest.“Drawn so by the client”, Ada Maker")).toBe(true);
  expect(says("The client’s sheet does not show them.")).toBe(true);
  expect(says("in the way")).toBe(false);
  expect(button("Issue B").disabled).toBe(false);
});

it("says nothing of either when there is neither", async () => {
  await show([standing({ ...thin, severity: "caution" })]);
  expect(says("set aside")).toBe(false);
  expect(button("Issue B").disabled).toBe(false);
});
