import { emptyBrief, type Job } from "#shared/contracts/jobs.ts";

const jobId = "00000000-0000-4000-8000-000000000142";
/** All that staff may do. */
export const all = {
  editBrief: true,
  editMockup: true,
  seeMockup: true,
  issue: true,
  move: true,
  seeShopOnly: true,
  giveConsent: false,
  share: true,
};
export const none = {
  editBrief: false,
  editMockup: false,
  seeMockup: false,
  issue: false,
  move: false,
  seeShopOnly: false,
  giveConsent: false,
  share: false,
};

/** A job of Orrery Books, ready for its mockup. */
export const buildJob = (change: Partial<Job>): Job => ({
  id: jobId,
  number: "CL-0142",
  title: "Lobby sign",
  state: "mockup",
  whoseMove: "ours",
  nextStep: "",
  client: { id: jobId, name: "Orrery Books" },
  dueOn: null,
  brief: emptyBrief,
  briefMissing: [],
  approvers: [],
  latest: null,
  approved: null,
  openNotes: 0,
  consent: { given: false, at: null },
  lastEvent: null,
  createdAt: "2026-11-30T09:00:00.000Z",
  can: all,
  ...change,
});
