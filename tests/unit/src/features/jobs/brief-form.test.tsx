// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { act } from "react";
import { createMemoryRouter, RouterProvider } from "react-router-dom";
import { afterAll, beforeAll, beforeEach, describe, expect, it } from "vitest";
import type { Job } from "#shared/contracts/jobs.ts";
import { BriefForm } from "@/features/jobs/components/brief-form.tsx";
import { type Answer, startAnswers } from "../../support/answers.ts";
import { button, field, press, render, type, until } from "../../support/render.tsx";
import { buildJob } from "./build-job.ts";

const contact = {
  id: "00000000-0000-4000-8000-000000000031",
  name: "Tamsin Orrery",
  email: "client@orrery.example",
  lastSeenAt: null,
};
const job = buildJob({ brief: { ...buildJob({}).brief, widthMm: 600, heightMm: 400, words: "ORRERY BOOKS" } });
let answer: Answer;
let server: Awaited<ReturnType<typeof startAnswers>>;

beforeAll(async () => {
  server = await startAnswers(({ method }) => {
    if (method === "PATCH") return answer;
    return {
      status: 200,
      json: {
        id: job.client.id,
        name: "Orrery Books",
        remarks: "",
        contacts: [contact],
        openJobs: 1,
        can: { change: true },
      },
    };
  });
});
afterAll(() => server.end());
beforeEach(() => {
  server.asked.length = 0;
  answer = { status: 200, json: job };
});

const sent = () => server.asked.filter(({ method }) => method === "PATCH").map(({ body }) => body);

async function openForm(side: "shop" | "client" = "shop") {
  const form = <BriefForm shop="copperlark-signs" unit="mm" job={job} side={side} />;
  const router = createMemoryRouter([
    { path: "/", element: form },
    { path: "/elsewhere", element: <p>elsewhere</p> },
  ]);
  await render(
    <QueryClientProvider client={new QueryClient()}>
      <RouterProvider router={router} />
    </QueryClientProvider>,
  );
  return router;
}

const checkboxOf = (label: string): HTMLInputElement | null => {
  const found = [...document.querySelectorAll("label")].find(({ textContent }) => textContent === label);
  const box = found && document.getElementById(found.htmlFor);
  return box instanceof HTMLInputElement ? box : null;
};

describe("the brief's form", () => {
  it("sends only what was changed, lengths in mm", async () => {
    const saved: Job = { ...job, brief: { ...job.brief, heightMm: 450 } };
    answer = { status: 200, json: saved };
    await openForm();
    expect(button("Save the brief").disabled).toBe(true);
    await type(field("Height"), "45 cm");
    await press(button("Save the brief"));
    await until(() => document.body.textContent?.includes("Saved."));
    expect(sent()).toEqual([{ brief: { heightMm: 450 } }]);
    expect(field("Height").value).toBe("450");
  });

  it("sends an emptied day and length as null, which clears them", async () => {
    await openForm();
    await type(field("Due on"), "2027-02-01");
    await type(field("Due on"), "");
    await type(field("Width"), "");
    await press(button("Save the brief"));
    await until(() => sent().length > 0);
    expect(sent()).toEqual([{ brief: { widthMm: null } }]);
  });

  it("sends the approvers chosen from the client's contacts", async () => {
    await openForm();
    const box = await until(() => checkboxOf(contact.name));
    await press(box);
    await press(button("Save the brief"));
    await until(() => sent().length > 0);
    expect(sent()).toEqual([{ approverIds: [contact.id] }]);
  });

  it("sends what asks for more care", async () => {
    await openForm();
    await press(await until(() => checkboxOf("It hangs over where people stand or walk")));
    await press(button("Save the brief"));
    await until(() => sent().length > 0);
    expect(sent()).toEqual([{ brief: { overhead: true } }]);
  });

  it("holds back what is no length", async () => {
    await openForm();
    await type(field("Width"), "wide");
    await press(button("Save the brief"));
    await until(() => field("Width").getAttribute("aria-invalid") === "true");
    expect(sent()).toEqual([]);
  });

  it("keeps a distance that can't be read, to be mended, and says how to write one", async () => {
    await openForm();
    await type(field("Read from how far"), "4 paces");
    expect(field("Read from how far").value).toBe("4 paces");
    await until(() => document.body.textContent?.includes("Write a number, like 5."));
    await type(field("Read from how far"), "4,5");
    expect(field("Read from how far").value).toBe("4.5");
    await press(button("Save the brief"));
    await until(() => sent().length > 0);
    expect(sent()).toEqual([{ brief: { viewingDistanceMm: 4500 } }]);
  });

  it.each([
    { label: "How many", text: "0", words: "Write a whole number from 1 to 1000." },
    { label: "How many", text: "", words: "Write a whole number from 1 to 1000." },
    { label: "How many", text: "1.5", words: "Write a whole number from 1 to 1000." },
    { label: "Width", text: "-5", words: "A sign is at least 20 mm (13/16 inch) wide and high." },
    { label: "Height", text: "99999", words: "At most 10 m (32 feet)." },
    { label: "Read from how far", text: "0", words: "Write a distance over 0." },
  ])('says what $label takes when "$text" is written', async ({ label, text, words }) => {
    await openForm();
    await type(field(label), text);
    await press(button("Save the brief"));
    await until(() => document.body.textContent?.includes(words));
    expect(sent()).toEqual([]);
  });

  it("asks about a due day that is past", async () => {
    await openForm();
    await type(field("Due on"), "2020-01-01");
    await until(() => document.body.textContent?.includes("That day is past. Is the year right?"));
  });

  it("puts the server's refusal under its field and keeps what was typed", async () => {
    const errors = [{ pointer: "/brief/widthMm", detail: "Wider than any bed of this shop." }];
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
    await openForm();
    await type(field("Width"), "9000");
    await press(button("Save the brief"));
    await until(() => document.body.textContent?.includes("Wider than any bed of this shop."));
    expect(field("Width").getAttribute("aria-invalid")).toBe("true");
    expect(field("Width").value).toBe("9000");
    expect(document.querySelector('[role="alert"]')?.textContent).toContain("Check the highlighted fields.");
  });

  it("asks before it is left with changes, and keeps them when one stays", async () => {
    const router = await openForm();
    await type(field("Width"), "700");
    await act(async () => void router.navigate("/elsewhere"));
    await until(() => document.body.textContent?.includes("Leave without saving?"));
    await press(button("Stay here"));
    expect(router.state.location.pathname).toBe("/");
    expect(field("Width").value).toBe("700");
    await act(async () => void router.navigate("/elsewhere"));
    await until(() => document.body.textContent?.includes("Leave without saving?"));
    await press(button("Leave"));
    await until(() => document.body.textContent === "elsewhere");
  });

  it("asks a client neither for title and day nor for who approves", async () => {
    await openForm("client");
    expect(field("Width").value).toBe("600");
    expect(() => field("What the sign is")).toThrow();
    expect(() => field("Due on")).toThrow();
    expect(document.body.textContent).not.toContain("Who approves");
  });
});
