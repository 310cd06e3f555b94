import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Person } from "#server/models/person.ts";
import { acceptInvitation, registerShop, whoAmI } from "#shared/contracts/account.ts";
import { inviteMember } from "#shared/contracts/shop.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildClient, buildContact } from "../support/factories/client.ts";
import { buildMember } from "../support/factories/member.ts";
import { caughtMails, tokenIn } from "../support/mail.ts";
import { signInAs, signInByMail } from "../support/sign-in.ts";

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.stop());

describe("an address that somebody else opened an account with", () => {
  it("is not proven by its reader accepting an invitation while signed in by a link", async () => {
    const email = "harbour.master@quay.example";
    const password = "squatting-here";
    await app.visitor().get(registerShop, { body: { shopName: "Squat", name: "S. Quat", email, password } });
    const squatter = app.visitor();
    await squatter.signIn("password", { email, password });
    const person = await Person.findOne({ where: { email }, rejectOnEmpty: true });
    await buildContact({ client: await buildClient(), person });
    const reader = await signInByMail(app, { email });

    const owner = await buildMember();
    const inviter = await signInAs(app, owner);
    await inviter.get(inviteMember, { params: { shop: owner.shop.slug }, body: { email, role: "owner" } });
    await app.runJobs();
    const mail = (await caughtMails(app)).find(({ to }) => to === email);
    const body = { token: tokenIn(mail?.text ?? "") };
    expect((await reader.refusal(acceptInvitation, { body })).code).toBe("not_signed_in");

    const { memberOf, contactOf } = await squatter.get(whoAmI);
    expect(memberOf.map(({ shopName }) => shopName)).toEqual(["Squat"]);
    expect(contactOf).toEqual([]);
  });
});
