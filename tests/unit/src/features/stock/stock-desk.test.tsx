// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { afterAll, beforeAll, beforeEach, describe, expect, it } from "vitest";
import type { StockItem } from "#shared/contracts/stock.ts";
import { StockDesk } from "@/features/stock/components/stock-desk.tsx";
import { type Answer, type Asked, startAnswers } from "../../support/answers.ts";
import { button, field, press, render, type, until } from "../../support/render.tsx";

const id = "00000000-0000-4000-8000-000000000801";
const epoxy: StockItem = {
  id,
  version: 3,
  retiredAt: null,
  name: "Slow epoxy",
  kind: "adhesive",
  adhesive: { stockId: id, name: "Slow epoxy", family: "epoxy" },
};
const screw: StockItem = {
  id: "00000000-0000-4000-8000-000000000802",
  version: 5,
  retiredAt: null,
  name: "No. 6 × 16, flat head",
  kind: "screw",
  screw: {
    name: "No. 6 × 16, flat head",
    gauge: 6,
    head: "flat",
    diameter: 3.5,
    length: 16,
    headDiameter: 7,
    headHeight: 2,
  },
  quantity: 24,
};

/** What the shop has, as the server would keep it. */
let shelf: StockItem[];
let writes: ((asked: Asked) => Answer)[];
let server: Awaited<ReturnType<typeof startAnswers>>;

function answerTo(asked: Asked): Answer {
  if (asked.method !== "GET") return writes.shift()?.(asked) ?? setState(asked);
  const query = new URL(asked.path, "http://localhost").searchParams;
  const retired = query.get("state") === "retired";
  const items = shelf.filter(
    (item) =>
      (item.retiredAt !== null) === retired &&
      (query.get("kind") ?? item.kind) === item.kind &&
      item.name.includes(query.get("q") ?? ""),
  );
  return { status: 200, json: { items, next: null } };
}
function setState({ path, body }: Asked): Answer {
  const retiredAt = (body as { state: string }).state === "retired" ? "2026-12-01T12:00:00.000Z" : null;
  shelf = shelf.map((item) => (path.includes(item.id) ? { ...item, retiredAt } : item));
  return { status: 200, json: shelf.find((item) => path.includes(item.id)) };
}

beforeAll(async () => {
  server = await startAnswers(answerTo);
});
afterAll(() => server.end());
beforeEach(() => {
  server.asked.length = 0;
  shelf = [epoxy, screw];
  writes = [];
});

const says = (words: string) => until(() => document.body.textContent?.includes(words));
const names = () =>
  [...document.querySelectorAll("button")].map((one) => one.getAttribute("aria-label") ?? one.textContent);

async function open({ mayChange = true, q = "" }: { mayChange?: boolean; q?: string } = {}) {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  await render(
    <QueryClientProvider client={client}>
      <main tabIndex={-1}>
        <StockDesk shop="s" unit="mm" kinds={["screw", "adhesive"]} q={q} mayChange={mayChange} />
      </main>
    </QueryClientProvider>,
  );
}

describe("the stock", () => {
  it("is only looked at by those who may not change it", async () => {
    await open({ mayChange: false });
    await says("Slow epoxy");
    await says("No. 6 × 16, flat head");
    expect(names()).toEqual(["Show it"]);
  });

  it("lets an item be taken out and brought back by the next press", async () => {
    await open();
    await says("Slow epoxy");
    await press(button("Take Slow epoxy out of stock"));
    await says("Slow epoxy is no longer in stock. Drawings that name it stay as they are.");
    expect(document.activeElement).toBe(button("Bring it back"));
    await until(() => !names().includes("Change Slow epoxy"));
    await press(button("Bring it back"));
    await says("Slow epoxy is back in stock.");
    await until(() => names().includes("Change Slow epoxy"));
  });

  it("shows what was taken out when asked, and brings it back from there", async () => {
    shelf = [{ ...epoxy, retiredAt: "2026-11-01T12:00:00.000Z" }];
    await open();
    await says("No adhesives in stock yet");
    await press(button("Show it"));
    await until(() => names().includes("Bring back Slow epoxy"));
    await press(button("Bring back Slow epoxy"));
    await until(() => names().includes("Change Slow epoxy"));
    await says("Nothing was taken out.");
  });

  it("says why something did not come back", async () => {
    const detail = "Slow epoxy is in stock already. Change that one, or take another name.";
    const code = "already_exists";
    writes = [() => ({ status: 409, json: { type: `/problems/${code}`, title: "No.", status: 409, code, detail } })];
    shelf = [{ ...epoxy, retiredAt: "2026-11-01T12:00:00.000Z" }];
    await open();
    await press(button("Show it"));
    await until(() => names().includes("Bring back Slow epoxy"));
    await press(button("Bring back Slow epoxy"));
    await says(detail);
  });

  it("says so when no name fits what is looked for", async () => {
    await open({ q: "epoxy" });
    await says("Slow epoxy");
    await says("Nothing here has “epoxy” in its name.");
  });

  it("counts screws, from the version that was read", async () => {
    writes = [({ body }) => ({ status: 200, json: { ...screw, ...(body as object), version: 6 } })];
    await open();
    await says("24 on hand");
    await press(button("Count No. 6 × 16, flat head"));
    await type(field("On hand"), "1.5");
    await press(button("Save the count"));
    await says("Write a whole number, 0 or more.");
    await type(field("On hand"), "240");
    await press(button("Save the count"));
    await says("No. 6 × 16, flat head: 240 on hand.");
    const sent = server.asked.filter(({ method }) => method !== "GET");
    expect(sent.map(({ body }) => body)).toEqual([{ version: 5, quantity: 240 }]);
  });

  it("brings in the usual list after asking, and says how much came", async () => {
    writes = [() => ({ status: 200, json: { added: 2 } })];
    await open();
    await press(button("Bring in the usual list"));
    await press(button("Bring it in"));
    await says("2 items were added from the usual list.");
  });
});
