// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { act } from "react";
import { MemoryRouter, Route, Routes } from "react-router-dom";
import { afterEach, beforeEach, expect, it } from "vitest";
import { SignInPage } from "@/app/pages/sign-in-page.tsx";
import { startAnswers } from "../support/answers.ts";
import { render, until } from "../support/render.tsx";

const ines = { id: "00000000-0000-4000-8000-000000000001", name: "Ines", email: "ines@orrery.example" };
let person: typeof ines | null;
let client: QueryClient;
let server: Awaited<ReturnType<typeof startAnswers>>;

beforeEach(async () => {
  person = null;
  client = new QueryClient();
  server = await startAnswers(() => ({ status: 200, json: { person, memberOf: [], contactOf: [], session: null } }));
});
afterEach(() => server.end());

const open = (address: string) =>
  render(
    <QueryClientProvider client={client}>
      <MemoryRouter initialEntries={[address]}>
        <Routes>
          <Route path="/sign-in" element={<SignInPage />} />
          <Route path="/shop/a/sheets/b" element={<p>The sheet with what was typed</p>} />
        </Routes>
      </MemoryRouter>
    </QueryClientProvider>,
  );
const seeAgain = () => act(async () => void document.dispatchEvent(new Event("visibilitychange", { bubbles: true })));
const answered = (times: number) => until(() => server.asked.length === times && client.isFetching() === 0);
const says = (words: string) => document.body.textContent?.includes(words);

it("goes on where it was once its reader has signed in by a link in another tab", async () => {
  await open("/sign-in?next=/shop/a/sheets/b");
  expect(says("Anything you typed there is still in it.")).toBe(true);
  await answered(1);
  await seeAgain();
  await answered(2);
  expect(says("Mail me a link")).toBe(true);
  person = ines;
  await seeAgain();
  await until(() => says("The sheet with what was typed"));
});

it("stays for somebody who was signed in already and wants to be somebody else", async () => {
  person = ines;
  await open("/sign-in?next=/shop/a/sheets/b");
  await answered(1);
  await seeAgain();
  await answered(2);
  expect(says("Mail me a link")).toBe(true);
});
