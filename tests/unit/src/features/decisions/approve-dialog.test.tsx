// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { act } from "react";
import { MemoryRouter } from "react-router-dom";
import { afterEach, beforeEach, expect, it, vi } from "vitest";
import type { Revision } from "#shared/contracts/revisions.ts";
import { ApproveDialog } from "@/features/decisions/components/approve-dialog.tsx";
import { type Answer, startAnswers } from "../../support/answers.ts";
import { button, press, render, type, until } from "../../support/render.tsx";

const id = (place: number) => `00000000-0000-4000-8000-${String(place).padStart(12, "0")}`;
const pdfSha256 = "5c".repeat(32);
const revision: Revision = {
  id: id(2),
  jobId: id(9),
  letter: "B",
  state: "issued",
  message: "",
  issuedAt: "2026-11-30T10:00:00.000Z",
  issuedBy: "Ada Finch",
  snapshotSha256: "a1".repeat(32),
  pdfSha256,
  pdfByteSize: 48_123,
  failure: null,
  decision: null,
  current: null,
  can: { note: true, decide: true, withdraw: false, download: true },
};
const sheet = {
  job: {
    id: id(9),
    number: "CL-0142",
    title: "Lobby sign",
    client: "Orrery Books",
    shopName: "Copperlark Signs",
    unit: "mm",
  },
  reader: { name: "Cleo Marsh", side: "client", approver: true },
  acknowledgements: [
    { id: "words", text: "It reads ORRERY BOOKS." },
    { id: "size", text: "It is 600 × 400 mm." },
  ],
} as const;
const note = { id: id(101), number: 4, text: "The moon stands too near the corner.", zone: "B2" };

let answer: Answer;
let server: Awaited<ReturnType<typeof startAnswers>>;
beforeEach(async () => {
  answer = { status: 200, json: { ...revision, state: "approved" } };
  server = await startAnswers(() => answer);
});
afterEach(() => server.end());

const sent = () => server.asked.filter(({ path }) => path.endsWith("/approve"));
const input = (selector: string) => {
  const found = document.querySelector<HTMLInputElement>(selector);
  if (!found) throw new Error(`nothing matches ${selector}`);
  return found;
};
const submit = () => press(button("Approve revision B"));

async function open(openNotes: readonly (typeof note)[] = []) {
  const handleApproved = vi.fn();
  const handleAskInstead = vi.fn();
  await render(
    <QueryClientProvider client={new QueryClient()}>
      <MemoryRouter>
        <ApproveDialog
          shop="copperlark-signs"
          revision={revision}
          sheet={{ ...sheet, acknowledgements: [...sheet.acknowledgements] }}
          openNotes={openNotes}
          proofAddress="/proof.pdf"
          pathOfSheet={(revisionId) => `/sheets/${revisionId}`}
          onClose={() => undefined}
          onApproved={handleApproved}
          onAskInstead={handleAskInstead}
        />
      </MemoryRouter>
    </QueryClientProvider>,
  );
  return { handleApproved, handleAskInstead };
}

async function fillIn() {
  const boxes = [...document.querySelectorAll<HTMLInputElement>("fieldset input[type=checkbox]")];
  for (const box of boxes) await press(box);
  await type(input("input[autocomplete=name]"), " Cleo Marsh ");
}

it("sends nothing before every line is ticked and a name is typed, and says what is missing", async () => {
  await open();
  await press(input("fieldset input[type=checkbox]"));
  await submit();
  expect(document.body.textContent).toContain("One line is not ticked yet.");
  expect(document.body.textContent).toContain("Type your name.");
  expect(sent()).toEqual([]);
});

it("sends the hash of the PDF that was shown, the ticked lines and the name, once, however often it is pressed", async () => {
  const { handleApproved } = await open();
  await fillIn();
  await act(async () => {
    button("Approve revision B").click();
    button("Approve revision B").click();
  });
  await until(() => handleApproved.mock.calls.length > 0);
  await submit();
  expect(sent()).toEqual([
    {
      method: "POST",
      path: `/api/shops/copperlark-signs/revisions/${id(2)}/approve`,
      body: {
        typedName: "Cleo Marsh",
        acknowledgedIds: ["words", "size"],
        pdfSha256,
        settledNoteIds: [],
        consentToPortfolio: false,
      },
    },
  ]);
});

it("asks once before it signs with a name that is not the reader's", async () => {
  const { handleApproved } = await open();
  await fillIn();
  await type(input("input[autocomplete=name]"), "Somebody Else");
  await submit();
  expect(document.body.textContent).toContain("This page knows you as Cleo Marsh.");
  expect(sent()).toEqual([]);
  await press(button("Approve revision B as Somebody Else"));
  await until(() => handleApproved.mock.calls.length > 0);
  expect(sent()).toMatchObject([{ body: { typedName: "Somebody Else" } }]);
});

it("asks of each open must-change note whether it is settled, and sends those that are", async () => {
  const { handleApproved } = await open([note]);
  await fillIn();
  await submit();
  expect(document.body.textContent).toContain("Say whether it is settled.");
  expect(sent()).toEqual([]);
  await press(input("input[value=settled]"));
  await submit();
  await until(() => handleApproved.mock.calls.length > 0);
  expect(sent().map(({ body }) => body)).toMatchObject([{ settledNoteIds: [id(101)] }]);
});

it("stops at a note that is not settled and offers to ask for a revision instead", async () => {
  const { handleAskInstead } = await open([note]);
  await fillIn();
  await press(input("input[value=stop]"));
  expect([...document.querySelectorAll("button")].map(({ textContent }) => textContent)).not.toContain(
    "Approve revision B",
  );
  await press(button("Ask for a revision"));
  expect(handleAskInstead).toHaveBeenCalledOnce();
  expect(sent()).toEqual([]);
});

it("leads to the letter now out when another took this one's place a moment ago", async () => {
  answer = {
    status: 409,
    json: {
      type: "/problems/wrong_state",
      title: "That can't be done now.",
      status: 409,
      code: "wrong_state",
      detail: "Revision B is superseded and takes no decision.",
      extra: { current: { revisionId: id(3), letter: "C" } },
    },
  };
  const { handleApproved } = await open();
  await fillIn();
  await submit();
  const link = await until(() => document.querySelector<HTMLAnchorElement>("[role=alert] a"));
  expect(link.textContent).toBe("Go to revision C, which is out now");
  expect(link.getAttribute("href")).toBe(`/sheets/${id(3)}`);
  expect(handleApproved).not.toHaveBeenCalled();
});
