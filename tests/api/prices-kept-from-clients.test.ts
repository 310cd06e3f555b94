import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { changePrices } from "#shared/contracts/prices.ts";
import { getProof } from "#shared/contracts/revisions.ts";
import type { PriceBook } from "#shared/cost/price-book.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildPriceBook } from "../support/build-price-book.ts";
import { type PolicyRow, policyTable, routeName } from "../support/policy-table.ts";
import { buildPolicyWorld, type PolicyWorld } from "../support/policy-world.ts";
import { popplerText } from "../support/poppler.ts";
import type { Given } from "../support/visitor.ts";

/** Figures and words that stand nowhere but in the price book. */
const marks = ["77731", "777.31", "777,31", "0.4321", "43.21", "Quillwort", "quillwort", "XPF", "Heronry levy"];

const markedBook = (): PriceBook => {
  const book = buildPriceBook();
  return {
    ...book,
    currency: "XPF",
    materials: [{ id: "quillwort", name: "Quillwort sheet", unit: "m²", price: 77_731, waste: 0.4321 }],
    labour: [{ id: "sign", name: "Quillwort work", perHour: 77_731, minutesEach: 30 }],
    markup: 0.4321,
    tax: { name: "Heronry levy", share: 0.4321 },
  };
};

let app: TestApp;
let world: PolicyWorld;
beforeAll(async () => {
  app = await startTestApp();
  world = await buildPolicyWorld(app);
  const { params, askers } = world;
  const { version } = await askers.owner.get(changePrices, { params, body: { version: 0, book: buildPriceBook() } });
  await askers.owner.get(changePrices, { params, body: { version, book: markedBook() } });
}, 120_000);
afterAll(() => app.stop());

const found = (text: string): string[] => marks.filter((mark) => text.includes(mark));
const reads = policyTable.filter(({ endpoint }) => endpoint.method === "GET");
const ask = ({ endpoint, given }: PolicyRow, who: keyof PolicyWorld["askers"]) =>
  world.askers[who].ask(endpoint, (given?.(world) ?? {}) as Given<typeof endpoint>);

describe("what a sign costs the shop", () => {
  it("is there for an owner, so that the marks would be seen", async () => {
    const row = reads.find(({ endpoint }) => endpoint.path.endsWith("/prices"));
    if (!row) throw new Error("The prices have no row.");
    expect(found((await ask(row, "owner")).text)).toEqual([
      "77731",
      "0.4321",
      "Quillwort",
      "quillwort",
      "XPF",
      "Heronry levy",
    ]);
  });

  it.each(reads.map((row) => ({ row, name: routeName(row.endpoint) })))(
    "is not in $name, for a client, a guest or a sales rep",
    async ({ row }) => {
      for (const who of ["approver", "other contact", "contact of another client", "nobody"] as const) {
        expect(found((await ask(row, who)).text), who).toEqual([]);
      }
      // Reps read the shop's log, which says that prices changed and never by how much.
      const amounts = marks.filter((mark) => /\d|XPF/.test(mark));
      const { text } = await ask(row, "rep");
      expect(amounts.filter((mark) => text.includes(mark))).toEqual([]);
    },
  );

  it("is on no page of the proof that a client opens", async () => {
    const { params, askers, revisionId } = world;
    const path = getProof.path.replace(":shop", params.shop).replace(":revisionId", revisionId);
    const cookie = [...askers.approver.cookies].map(([key, value]) => `${key}=${value}`).join("; ");
    const answer = await fetch(app.baseUrl + path, { headers: { Cookie: cookie } });
    expect(answer.status).toBe(200);
    const text = await popplerText(new Uint8Array(await answer.arrayBuffer()), "pdftotext");
    expect(text).toContain("Midnight");
    expect(found(text)).toEqual([]);
  });
});
