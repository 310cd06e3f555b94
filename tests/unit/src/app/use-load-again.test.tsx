// @vitest-environment jsdom
import { lazy, Suspense } from "react";
import { createMemoryRouter, RouterProvider, useRouteError } from "react-router-dom";
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

function Broken() {
  return <Screen error={useRouteError()} />;
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
afterEach(() => {
  server.end();
  vi.restoreAllMocks();
});

it("loads a page anew that a newer version has taken the parts of, and once only", async () => {
  await render(<Screen error={missingPart()} />);
  await says("loading again");
  await until(() => reload.mock.calls.length === 1);
  await render(<Screen error={missingPart()} />);
  await says("broke");
  expect(reload).toHaveBeenCalledTimes(1);
});

it("does so when the part was missed in the middle of a page, whose screen is drawn more than once", async () => {
  const error = missingPart();
  const Dialog = lazy(() => Promise.reject(error));
  const page = (
    <Suspense>
      <Dialog />
    </Suspense>
  );
  vi.spyOn(console, "error").mockImplementation(() => undefined);
  await render(
    <RouterProvider router={createMemoryRouter([{ path: "/", element: page, errorElement: <Broken /> }])} />,
  );
  await until(() => reload.mock.calls.length === 1);
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
