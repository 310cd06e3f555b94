// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { createMemoryRouter, RouterProvider } from "react-router-dom";
import { afterAll, beforeAll, beforeEach, describe, expect, it } from "vitest";
import type { LimitSet } from "#shared/contracts/limits.ts";
import { limitKeys } from "#shared/dry-fit/limit-descriptions.ts";
import { defaultLimits, type Limits } from "#shared/dry-fit/limits.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { LimitsForm } from "@/features/limits/components/limits-form.tsx";
import { LimitsToRead } from "@/features/limits/components/limits-to-read.tsx";
import { type Answer, startAnswers } from "../../support/answers.ts";
import { button, field, press, render, type, until } from "../../support/render.tsx";

const setWith = (limits: Partial<Limits>, version = 0): LimitSet => ({
  version,
  limits: { ...defaultLimits, ...limits },
  savedAt: version === 0 ? null : "2026-11-30T09:12:00.000Z",
  savedBy: version === 0 ? null : "Tamsin Lark",
  can: { change: true },
});

let answer: Answer;
let server: Awaited<ReturnType<typeof startAnswers>>;
beforeAll(async () => {
  server = await startAnswers(() => answer);
});
afterAll(() => server.end());
beforeEach(() => {
  server.asked.length = 0;
  answer = { status: 200, json: setWith({}) };
});

const sent = () => server.asked.filter(({ method }) => method === "PUT").map(({ body }) => body);
const page = () => document.body.textContent ?? "";
const says = (words: string) => until(() => page().includes(words));

async function open(set: LimitSet, unit: LengthUnit = "mm") {
  const explanationOf = (rule: number) => (rule === 21 ? null : `/explained#rule-${rule}`);
  const form = <LimitsForm shop="copperlark-signs" unit={unit} set={set} explanationOf={explanationOf} />;
  await render(
    <QueryClientProvider client={new QueryClient()}>
      <RouterProvider router={createMemoryRouter([{ path: "/", element: form }])} />
    </QueryClientProvider>,
  );
}

describe("the limits as a form", () => {
  it("has a field for every limit, in the units of the shop", async () => {
    await open(setWith({ bedWidthMm: 914.4 }), "in");
    expect(document.querySelectorAll("input")).toHaveLength(limitKeys.length);
    expect(field("Width of the bed").value).toBe("36″");
    expect(field("Placing error of a hole, a side").value).toBe("0.020″");
    expect(field("Area off its support, for a caution").value).toBe("10");
    expect(field("Expansion of acrylic").value).toBe("70");
    expect(page()).toContain("Default 35 7/16″");
    expect(button("Save the limits").disabled).toBe(true);
  });

  it("leads from a rule to how it is worked out, where there is something to work out", async () => {
    await open(setWith({}));
    const links = [...document.querySelectorAll("a")].map((link) => link.getAttribute("href"));
    expect(links).toEqual(expect.arrayContaining(["/explained#rule-1", "/explained#rule-6", "/explained#rule-17"]));
    expect(links).not.toContain("/explained#rule-21");
    expect(page()).toContain("Rule 21");
  });

  it("saves the whole set onto the version it began from, in mm and as shares", async () => {
    await open(setWith({ coverMm: 1.5 }, 4), "in");
    await type(field("Area off its support, for a caution"), "12,5");
    await type(field("Width of the bed"), "48");
    await says("2 changes not saved yet.");
    const changed = { coverMm: 1.5, unsupportedCaution: 0.125, bedWidthMm: 1219.2 };
    answer = { status: 200, json: setWith(changed, 5) };
    await press(button("Save the limits"));
    await says("Saved. Mockups keep to them from now on");
    expect(sent()).toEqual([{ version: 4, limits: { ...defaultLimits, ...changed } }]);
    await type(field("Width of the bed"), "50");
    await press(button("Save the limits"));
    await until(() => sent().length === 2);
    expect(sent()[1]).toMatchObject({ version: 5 });
  });

  it("marks what is the shop's own and what is not saved, and leads back to the default", async () => {
    await open(setWith({ coverMm: 1.5 }, 1));
    expect(page()).toContain(`1 of ${limitKeys.length} limits is the shop’s own.`);
    expect(page()).toContain("The shop’s own");
    await press(button("Cover of cap and barrel over the hole's edge: back to the default, 1 mm"));
    expect(field("Cover of cap and barrel over the hole's edge").value).toBe("1");
    await says("Every limit is at its default.");
    await says("1 change not saved yet.");
    expect(page()).toContain("Not saved yet");
  });

  it("brings all of them back at once, also what can't be read", async () => {
    await open(setWith({ coverMm: 1.5, reachMm: 12 }, 1));
    await type(field("Change of temperature inside"), "warm");
    expect(field("Change of temperature inside").value).toBe("warm");
    await press(button("All back to the defaults"));
    expect(field("Change of temperature inside").value).toBe("20");
    expect(field("Reach over its support").value).toBe("10");
    answer = { status: 200, json: setWith({}, 2) };
    await press(button("Save the limits"));
    await until(() => sent().length > 0);
    expect(sent()).toEqual([{ version: 1, limits: defaultLimits }]);
  });

  it("says at each field what it takes, and takes a crossing back when either side is mended", async () => {
    await open(setWith({}));
    await type(field("Area off its support, for a caution"), "45");
    await type(field("Thinnest stroke that is free"), "");
    await type(field("Change of temperature outside"), "200");
    await press(button("Save the limits"));
    await says("Not over 30 %, which is “Area off its support, for a stop”.");
    expect(page()).toContain("Fill this in.");
    expect(page()).toContain("From 0 K to 100 K.");
    expect(page()).toContain("3 changes not saved yet. 3 limits to mend first.");
    expect(sent()).toEqual([]);
    expect(field("Area off its support, for a caution").getAttribute("aria-invalid")).toBe("true");
    await type(field("Area off its support, for a stop"), "50");
    await until(() => !page().includes("Not over 30 %"));
  });

  it("lays a newer set before the reader: one's own changes go over it, or it is taken", async () => {
    const newer = setWith({ reachMm: 15, coverMm: 2 }, 1);
    const stale = {
      type: "/problems/stale",
      title: "Someone saved a newer version.",
      status: 409,
      code: "stale",
      extra: { newer },
    };
    await open(setWith({}));
    await type(field("Cover of cap and barrel over the hole's edge"), "3");
    answer = { status: 409, json: stale };
    await press(button("Save the limits"));
    await says("Not saved: the limits were changed meanwhile.");
    expect(page()).toContain("Tamsin Lark saved others");
    await press(button("Lay my changes over theirs"));
    expect(field("Cover of cap and barrel over the hole's edge").value).toBe("3");
    expect(field("Reach over its support").value).toBe("15");
    await press(button("Save the limits"));
    await says("Not saved: the limits were changed meanwhile.");
    expect(sent()[1]).toEqual({ version: 1, limits: { ...newer.limits, coverMm: 3 } });
    await press(button("Take theirs"));
    expect(field("Cover of cap and barrel over the hole's edge").value).toBe("2");
    expect(button("Save the limits").disabled).toBe(true);
  });

  it("puts the server's refusal under its field", async () => {
    await open(setWith({}));
    await type(field("Height of the bed"), "610");
    const errors = [{ pointer: "/limits/bedHeightMm", detail: "Taller than the room." }];
    answer = {
      status: 422,
      json: {
        type: "/problems/validation",
        title: "Check the highlighted fields.",
        status: 422,
        code: "validation_failed",
        errors,
      },
    };
    await press(button("Save the limits"));
    await says("Taller than the room.");
    expect(field("Height of the bed").getAttribute("aria-invalid")).toBe("true");
    expect(field("Height of the bed").value).toBe("610");
  });
});

it("those who do not set the limits read them, with no field and no button", async () => {
  const set = { ...setWith({ coverMm: 1.25 }, 2), can: { change: false } };
  const list = <LimitsToRead unit="mm" set={set} explanationOf={() => null} />;
  await render(<RouterProvider router={createMemoryRouter([{ path: "/", element: list }])} />);
  expect(document.querySelectorAll("input, button")).toHaveLength(0);
  expect(page()).toContain("Cover of cap and barrel over the hole's edge1.25 mmDefault 1 mmThe shop’s own");
});
