import { describe, expect, it } from "vitest";
import type { Job } from "#shared/contracts/jobs.ts";
import { nextActionOf, wayToMockup } from "@/features/jobs/components/next-action.ts";
import { all, buildJob, none } from "./build-job.ts";

const jobId = "00000000-0000-4000-8000-000000000142";
const revisionId = "00000000-0000-4000-8000-000000000302";
const latest = { revisionId, letter: "B", state: "issued" };
const sheet = `/shop/s/sheets/${revisionId}`;
const mockup = `/shop/s/jobs/${jobId}/mockup`;

describe("nextActionOf, for the shop", () => {
  it.each<{ name: string; change: Partial<Job>; action: unknown }>([
    {
      name: "a brief with gaps is filled in",
      change: { state: "brief" },
      action: { kind: "part", label: "Fill in the brief", id: "brief" },
    },
    {
      name: "a complete brief leads to the mockup",
      change: {},
      action: { kind: "go", label: "Open the mockup", to: mockup },
    },
    {
      name: "a rep only looks at the mockup",
      change: { can: { ...all, editMockup: false } },
      action: { kind: "go", label: "Look at the mockup", to: mockup },
    },
    {
      name: "open notes are answered on the sheet",
      change: { state: "out for proof", latest, openNotes: 2 },
      action: { kind: "go", label: "Answer the notes", to: sheet },
    },
    {
      name: "a proof out is only looked at",
      change: { state: "out for proof", whoseMove: "client", latest, openNotes: 0 },
      action: { kind: "go", label: "Look at revision B", to: sheet },
    },
    {
      name: "a revision asked leads to the mockup",
      change: { state: "revision asked", latest },
      action: { kind: "go", label: "Open the mockup", to: mockup },
    },
    {
      name: "an approved job is built",
      change: { state: "approved", latest },
      action: { kind: "move", label: "Start the build", move: "in build" },
    },
    {
      name: "one who may not move it looks at what was approved",
      change: { state: "approved", latest, can: none },
      action: { kind: "go", label: "Look at revision B", to: sheet },
    },
    {
      name: "a job on hold is taken up again",
      change: { state: "on hold" },
      action: { kind: "move", label: "Take it up again", move: "taken up again" },
    },
    { name: "a closed job asks for nothing", change: { state: "closed", latest }, action: null },
  ])("$name", ({ change, action }) => {
    expect(nextActionOf(buildJob(change), "s", "shop")).toEqual(action);
  });
});

describe("nextActionOf, for the client", () => {
  it("leads to the sheet, never to the mockup", () => {
    const job = buildJob({ state: "revision asked", latest, can: { ...none, seeMockup: true } });
    expect(nextActionOf(job, "s", "client")).toEqual({ kind: "go", label: "Look at revision B", to: sheet });
  });
  it("is the brief when it was sent to them", () => {
    const job = buildJob({ state: "brief", can: { ...none, editBrief: true } });
    expect(nextActionOf(job, "s", "client")).toMatchObject({ kind: "part", id: "brief" });
  });
  it("is nothing before there is a drawing", () => {
    expect(nextActionOf(buildJob({ can: none }), "s", "client")).toBeNull();
  });
});

describe("wayToMockup", () => {
  it("stays open while a proof is out, so that the next letter can be issued", () => {
    const job = buildJob({ state: "out for proof", whoseMove: "ours", latest, openNotes: 1 });
    expect(nextActionOf(job, "s", "shop")).toMatchObject({ to: sheet });
    expect(wayToMockup(job, "s")).toEqual({ label: "Open the mockup", to: mockup });
  });

  it("is a look for those who may not change it, and none for those who see no mockups", () => {
    expect(wayToMockup(buildJob({ can: { ...all, editMockup: false } }), "s")).toEqual({
      label: "Look at the mockup",
      to: mockup,
    });
    expect(wayToMockup(buildJob({ can: none }), "s")).toBeNull();
  });
});
