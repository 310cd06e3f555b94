// @vitest-environment jsdom
import { act } from "react";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import type { Mockup } from "#shared/contracts/mockups.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { draftKeeper } from "@/features/mockup/editor/draft-keeper.ts";
import { useIsSaveLeft } from "@/features/mockup/editor/saves-left.ts";
import { type Saving, useAutosave } from "@/features/mockup/editor/use-autosave.ts";
import { type Answer, startAnswers } from "../../../support/answers.ts";
import { render, until } from "../../../support/render.tsx";
import { emptyMockup } from "../sample-mockup.ts";
import { memoryShelf } from "./memory-shelf.ts";

const place = { personId: "p1", shop: "copperlark-signs", jobId: "0b8f7c52-2c1e-4a55-9d55-0a2c5a1f9c11" };
const start: Mockup = {
  version: 3,
  document: emptyMockup(),
  savedAt: null,
  savedBy: null,
  can: { edit: true, issue: true },
};
const edited = emptyMockup({ quantity: 2 });
const saved = (version: number, document: MockupDocument): Mockup => ({
  ...start,
  version,
  document,
  savedAt: "2026-03-04T09:41:00.000Z",
  savedBy: "Robin",
});

/** What the desk said that the server holds, in this order. */
let told: Mockup[];
/** The page that the desk lies on, and goes on after it. */
function OtherPage({ jobId = place.jobId }: { jobId?: string }) {
  return <p>{useIsSaveLeft({ shop: place.shop, jobId }) ? "being saved" : "may be opened"}</p>;
}

let saving: Saving;
let shelf: ReturnType<typeof memoryShelf>;
let keeper: ReturnType<typeof draftKeeper>;
function Desk({ document }: { document: MockupDocument }) {
  const lastChange = `Quantity ${document.quantity}`;
  const onSaved = (mockup: Mockup) => void told.push(mockup);
  saving = useAutosave({ mockup: start, start: start.document, document, place, lastChange, keeper, onSaved });
  return null;
}

let answers: Awaited<ReturnType<typeof startAnswers>>;
let answer: (body: unknown) => Answer | Promise<Answer>;
let desk: Awaited<ReturnType<typeof render>>;
beforeEach(async () => {
  told = [];
  shelf = memoryShelf();
  keeper = draftKeeper({ shelf, place, deskId: "d1", onOutcome: () => undefined });
  answer = () => ({ status: 200, json: saved(4, edited) });
  answers = await startAnswers(({ body }) => answer(body));
  desk = await render(<Desk document={start.document} />);
});
afterEach(async () => {
  await desk.end();
  answers.end();
});

/** What this browser keeps of the desk's work. */
async function keptHere() {
  const [draft] = await shelf.list(place);
  return draft ?? null;
}
const untilKept = async (isKept: boolean) => {
  for (let look = 0; look < 300; look += 1) {
    if (((await keptHere()) !== null) === isKept) return;
    await act(async () => {
      await new Promise((resolve) => setTimeout(resolve, 10));
    });
  }
  throw new Error(`the work is ${isKept ? "not" : "still"} kept`);
};

/** The answer comes while the page goes on drawing, so it is waited for outside of the act that asks. */
async function saveNow(): Promise<number | null> {
  const answered: (number | null)[] = [];
  await act(async () => {
    void saving.saveNow().then((version) => answered.push(version));
  });
  await until(() => answered.length > 0);
  return answered[0] ?? null;
}

describe("saving what is on the desk", () => {
  it("sends the edit with the version it began from, and is saved at the answer's version", async () => {
    await desk.redraw(<Desk document={edited} />);
    expect(saving.unsaved).toBe(true);
    await until(() => saving.autosave.state === "saved" && saving.autosave.version === 4);
    expect(answers.asked).toHaveLength(1);
    expect(answers.asked[0]).toMatchObject({ method: "PUT", body: { version: 3, document: { quantity: 2 } } });
    expect(saving.unsaved).toBe(false);
  });

  /** Holds the answer to the first save back until the test lets it go; the version counts on from 4. */
  function holdFirstSave(): () => void {
    let letGo = () => {};
    const held = new Promise<void>((resolve) => {
      letGo = resolve;
    });
    let version = 3;
    answer = async () => {
      version += 1;
      if (version > 4) return { status: 200, json: saved(version, start.document) };
      await held;
      return { status: 200, json: saved(4, edited) };
    };
    return letGo;
  }

  it("sends an undo, too, that is pressed while the edit is on its way", async () => {
    const letGo = holdFirstSave();
    await desk.redraw(<Desk document={edited} />);
    await until(() => answers.asked.length === 1);
    await desk.redraw(<Desk document={start.document} />);
    letGo();
    await until(() => saving.autosave.state === "saved" && saving.autosave.version === 5);
    expect(answers.asked[1]).toMatchObject({ body: { version: 4, document: { quantity: 1 } } });
    expect(saving.unsaved).toBe(false);
  });

  it("sends what was changed while a save was on its way, when the desk is left meanwhile", async () => {
    const letGo = holdFirstSave();
    await desk.redraw(<Desk document={edited} />);
    await until(() => answers.asked.length === 1);
    await desk.redraw(<Desk document={emptyMockup({ quantity: 3 })} />);
    await desk.redraw(<p>Another page</p>);
    expect((await keptHere())?.document.quantity).toBe(3);
    letGo();
    await until(() => answers.asked.length === 2);
    expect(answers.asked[1]).toMatchObject({ body: { version: 4, document: { quantity: 3 } } });
    await untilKept(false);
  });

  it("says that a save is under way until all that was changed is answered, so that no desk begins from before it", async () => {
    const letGo = holdFirstSave();
    await desk.redraw(<Desk document={edited} />);
    await until(() => answers.asked.length === 1);
    await desk.redraw(<Desk document={emptyMockup({ quantity: 3 })} />);
    await desk.redraw(
      <>
        <OtherPage />
        <OtherPage jobId="3f0f4f6e-52d5-4d3e-8a7e-6a0f6c1d2b11" />
      </>,
    );
    expect(desk.element.textContent).toBe("being savedmay be opened");
    letGo();
    await until(() => desk.element.textContent === "may be openedmay be opened");
    expect(answers.asked).toHaveLength(2);
    expect(told.map(({ version, document }) => [version, document.quantity])).toEqual([
      [4, 2],
      [5, 3],
    ]);
  });

  it("tells of the newer version that it comes upon on the way out", async () => {
    const newer = saved(9, emptyMockup({ quantity: 7 }));
    answer = () => ({
      status: 409,
      json: { type: "/problems/stale", title: "Stale", status: 409, code: "stale", extra: { newer } },
    });
    await desk.redraw(<Desk document={edited} />);
    await desk.redraw(<OtherPage />);
    await until(() => desk.element.textContent === "may be opened" && told.length > 0);
    expect(told).toEqual([newer]);
    expect(await keptHere()).toMatchObject({ version: 3, document: { quantity: 2 } });
  });

  it("stops at a newer version, keeps the work here, and saves over it when told to keep mine", async () => {
    const newer = saved(9, emptyMockup({ quantity: 7 }));
    answer = () => ({
      status: 409,
      json: { type: "/problems/stale", title: "Stale", status: 409, code: "stale", extra: { newer } },
    });
    await desk.redraw(<Desk document={edited} />);
    await until(() => saving.autosave.state === "stale");
    await untilKept(true);
    expect(await keptHere()).toMatchObject({ version: 3, changes: 1, lastChange: "Quantity 2", document: edited });
    answer = () => ({ status: 200, json: saved(10, edited) });
    await act(async () => saving.keepMine());
    await until(() => saving.autosave.state === "saved");
    expect(answers.asked.at(-1)).toMatchObject({ body: { version: 9, document: { quantity: 2 } } });
    await untilKept(false);
  });

  it("keeps the work here while the server can't be reached, and saves once it is back", async () => {
    answer = () => ({ status: 503, json: {} });
    await desk.redraw(<Desk document={edited} />);
    await until(() => saving.autosave.state === "offline");
    await untilKept(true);
    expect((await keptHere())?.version).toBe(3);
    answer = () => ({ status: 200, json: saved(4, edited) });
    await act(async () => window.dispatchEvent(new Event("online")));
    await until(() => saving.autosave.state === "saved");
    await untilKept(false);
  });

  it("saves at once when a revision is to be issued, and says so when that can't be done", async () => {
    await desk.redraw(<Desk document={edited} />);
    expect(await saveNow()).toBe(4);
    answer = () => ({
      status: 403,
      json: {
        type: "/problems/not_allowed",
        title: "You may look, but not do this.",
        status: 403,
        code: "not_allowed",
      },
    });
    await desk.redraw(<Desk document={emptyMockup({ quantity: 5 })} />);
    expect(await saveNow()).toBeNull();
    expect(saving.autosave).toMatchObject({ state: "refused", why: "You may look, but not do this." });
  });

  it("keeps the work here also while the answer to a save is awaited, and lets go of it with the answer", async () => {
    const letGo = holdFirstSave();
    await desk.redraw(<Desk document={edited} />);
    await until(() => answers.asked.length === 1);
    await untilKept(true);
    expect(await keptHere()).toMatchObject({ version: 3, document: { quantity: 2 } });
    letGo();
    await until(() => saving.autosave.state === "saved");
    await untilKept(false);
  });

  it("asks the browser to hold the page while there is unsaved work", async () => {
    const leave = () => {
      const event = new Event("beforeunload", { cancelable: true });
      window.dispatchEvent(event);
      return event.defaultPrevented;
    };
    expect(leave()).toBe(false);
    await desk.redraw(<Desk document={edited} />);
    expect(leave()).toBe(true);
    await until(() => saving.autosave.state === "saved" && saving.autosave.version === 4);
    expect(leave()).toBe(false);
  });
});
