import { ApiProblem, problemOf, unreachable } from "./api-client.ts";

async function send(path: string, body: Record<string, string> | null): Promise<Record<string, unknown>> {
  let response: Response;
  let text: string;
  try {
    response = await fetch(path, {
      credentials: "same-origin",
      ...(body === null
        ? {}
        : {
            method: "POST",
            headers: { "Content-Type": "application/json", "X-Auth-Return-Redirect": "1", "X-Standproud": "1" },
            body: JSON.stringify(body),
          }),
    });
    text = await response.text();
  } catch {
    throw unreachable();
  }
  if (!response.ok) throw problemOf(response.status, text);
  try {
    return JSON.parse(text) as Record<string, unknown>;
  } catch {
    throw problemOf(500, text);
  }
}

async function post(path: string, fields: Record<string, string>): Promise<URL> {
  const { csrfToken } = await send("/auth/csrf", null);
  const answer = await send(path, { ...fields, csrfToken: String(csrfToken), callbackUrl: window.location.origin });
  return new URL(String(answer.url ?? "/"), window.location.origin);
}

/** Signs in with a password. A refused sign-in answers with success and an `error` in the address it names. */
export async function signInWithPassword(email: string, password: string): Promise<void> {
  const url = await post("/auth/callback/password", { email: email.trim().toLowerCase(), password });
  if (url.searchParams.has("error")) {
    throw new ApiProblem("not_signed_in", "Address and password do not belong together. Try again.", null);
  }
}

/** Spends a mailed link and signs its addressee in. */
export async function signInWithLink(token: string): Promise<void> {
  const url = await post("/auth/callback/link", { token });
  if (url.searchParams.has("error")) {
    throw new ApiProblem("link_spent", "This link has been used or has run out.", null);
  }
}

export async function signOut(): Promise<void> {
  await post("/auth/signout", {});
}
