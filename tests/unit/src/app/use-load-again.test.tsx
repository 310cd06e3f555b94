// @vitest-environment jsdom
import { afterEach, beforeAll, beforeEach, expect, it, vi } from "vitest";
import { useLoadAgain } from "@/app/use-load-again.ts";
import { listenForMissingParts } from "@/lib/missing-part.ts";
import { startAnswers } from "../support/answers.ts";
import { render, until } from "../support/render.tsx";

const reload = vi.fn();
let server: Awaited<ReturnType<typeof startAnswers>>;
let status = 200;

function Screen({ error }: { readonly error: unknown }) {
  return <p>{useLoadAgain(error, reload) ? "loading again" : "broke"}</p>;
}

/** A part of the application that could not be fetched, as the bundler's loader tells it. */
function missingPart(): Error {
  const payload = new Error("Failed to fetch a module");
  window.dispatchEvent(Object.assign(new Event("vite:preloadError"), { payload }));
  return payload;
}

const says = (words: string) => until(() => document.body.textContent === words);

beforeAll(listenForMissingParts);
beforeEach(async () => {
  status = 200;
  reload.mockClear();
  window.sessionStorage.clear();
  server = await startAnswers(() => ({ status, json: {} }));
});
afterEach(() => server.end());

it("loads a page anew that a newer version has taken the parts of, and once only", async () => {
  await render(<Screen error={missingPart()} />);
  await says("loading again");
  await until(() => reload.mock.calls.length === 1);
  await render(<Screen error={missingPart()} />);
  await says("broke");
  expect(reload).toHaveBeenCalledTimes(1);
});

it("stays where the server is away: what is shown is better than the browser’s own page", async () => {
  status = 503;
  await render(<Screen error={missingPart()} />);
  await says("broke");
  expect(server.asked.map(({ path }) => path)).toEqual(["/api/ready"]);
  expect(reload).not.toHaveBeenCalled();
});

it("leaves any other fault to the reader", async () => {
  await render(<Screen error={new Error("Failed to fetch a module")} />);
  await says("broke");
  expect([server.asked, reload.mock.calls]).toEqual([[], []]);
});
