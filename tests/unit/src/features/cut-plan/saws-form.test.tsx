// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { createMemoryRouter, RouterProvider } from "react-router-dom";
import { afterAll, beforeAll, beforeEach, describe, expect, it } from "vitest";
import type { SawSet } from "#shared/contracts/saws.ts";
import { sawFields } from "#shared/cut-plan/saw-fields.ts";
import { type ShopSaws, usualSaws } from "#shared/cut-plan/shop-saws.ts";
import { SawsPart } from "@/features/cut-plan/components/saws-part.tsx";
import { type Answer, startAnswers } from "../../support/answers.ts";
import { button, field, press, render, type, until } from "../../support/render.tsx";

const setWith = (saws: Partial<ShopSaws>, version = 0, change = true): SawSet => ({
  version,
  saws: { ...usualSaws, ...saws },
  savedAt: version === 0 ? null : "2026-11-30T09:12:00.000Z",
  savedBy: version === 0 ? null : "Tamsin Lark",
  can: { change },
});

let answer: Answer;
let server: Awaited<ReturnType<typeof startAnswers>>;
beforeAll(async () => {
  server = await startAnswers(() => answer);
});
afterAll(() => server.end());
beforeEach(() => {
  server.asked.length = 0;
});

const sent = () => server.asked.filter(({ method }) => method === "PUT").map(({ body }) => body);
const page = () => document.body.textContent ?? "";
async function open(set: SawSet) {
  const part = <SawsPart shop="copperlark-signs" unit="mm" set={set} />;
  await render(
    <QueryClientProvider client={new QueryClient()}>
      <RouterProvider router={createMemoryRouter([{ path: "/", element: part }])} />
    </QueryClientProvider>,
  );
}

describe("how we cut, as a form", () => {
  it("saves all figures onto the version that it began from", async () => {
    await open(setWith({ squaringMm: 12 }, 3));
    expect(document.querySelectorAll("input")).toHaveLength(sawFields.length);
    expect(button("Save and plan again").disabled).toBe(true);
    await type(field("Kerf of the saw"), "2.4");
    await type(field("Share lost to knots"), "15");
    expect(page()).toContain("2 changes not saved yet.");
    answer = { status: 200, json: setWith({ squaringMm: 12, sawKerfMm: 2.4, rejectShare: 0.15 }, 4) };
    await press(button("Save and plan again"));
    await until(() => page().includes("Saved. Every plan of the shop keeps to it."));
    expect(sent()).toEqual([{ version: 3, saws: { ...usualSaws, squaringMm: 12, sawKerfMm: 2.4, rejectShare: 0.15 } }]);
  });

  it("says at the field what would be right, and sends nothing", async () => {
    await open(setWith({}));
    await type(field("Share lost to knots"), "95");
    await press(button("Save and plan again"));
    expect(page()).toContain("From 0 % to 90 %.");
    expect(page()).toContain("1 figure to mend first.");
    expect(sent()).toEqual([]);
  });

  it("lays somebody else's figures before the reader and puts one's own on top of them", async () => {
    await open(setWith({}));
    await type(field("Kerf of the saw"), "2");
    const newer = setWith({ squaringMm: 25 }, 1);
    answer = {
      status: 409,
      json: {
        type: "/problems/stale",
        title: "Stale",
        status: 409,
        code: "stale",
        instance: "/",
        requestId: "r",
        extra: { newer },
      },
    };
    await press(button("Save and plan again"));
    await until(() => page().includes("Not saved: the figures were changed meanwhile."));
    await press(button("Lay my changes over theirs"));
    expect(field("Cut off to square a bar's end").value).toBe("25");
    answer = { status: 200, json: setWith({ squaringMm: 25, sawKerfMm: 2 }, 2) };
    await press(button("Save and plan again"));
    await until(() => page().includes("Saved."));
    expect(sent().at(-1)).toEqual({ version: 1, saws: { ...usualSaws, squaringMm: 25, sawKerfMm: 2 } });
  });

  it("is to be read only by who may not change it", async () => {
    await open(setWith({ barLengthMm: 3000 }, 1, false));
    expect(document.querySelector("input")).toBeNull();
    expect(page()).toContain("Length that bars are bought in3000 mm");
  });
});
