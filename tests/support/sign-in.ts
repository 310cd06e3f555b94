import { requestLink } from "#shared/contracts/account.ts";
import type { TestApp } from "./app.ts";
import { testPassword } from "./factories/person.ts";
import { caughtMails, tokenIn } from "./mail.ts";
import type { Visitor } from "./visitor.ts";

/** Signs someone in with the password that buildPerson() gave them, through the page's own requests. */
export async function signInAs(app: TestApp, { email }: { email: string }): Promise<Visitor> {
  const visitor = app.visitor();
  const url = await visitor.signIn("password", { email, password: testPassword });
  if (url.searchParams.has("error")) throw new Error(`${email} could not sign in: ${url}`);
  return visitor;
}

/** Signs a client's contact in by a link that was really mailed. */
export async function signInByMail(app: TestApp, { email }: { email: string }): Promise<Visitor> {
  const visitor = app.visitor();
  await visitor.get(requestLink, { body: { email } });
  await app.runJobs();
  const mail = (await caughtMails(app)).find(({ to }) => to === email);
  const url = await visitor.signIn("link", { token: tokenIn(mail?.text ?? "") });
  if (url.searchParams.has("error")) throw new Error(`${email} could not sign in by a link: ${url}`);
  return visitor;
}
