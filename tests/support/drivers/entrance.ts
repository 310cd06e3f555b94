import type { Page } from "playwright-core";

/** Registering, joining and signing in. */
export function entrance(page: Page) {
  const button = (name: string | RegExp) => page.getByRole("button", { name });
  return {
    async register(person: { shopName: string; name: string; email: string; password: string }) {
      await page.goto("/register");
      await page.getByLabel("Name of the shop").fill(person.shopName);
      await page.getByLabel("Your name").fill(person.name);
      await page.getByLabel("Your e-mail address").fill(person.email);
      await page.getByLabel("Password").fill(person.password);
      await button("Open the shop").click();
      await page.waitForURL(/\/bench$/);
    },
    /** Takes up an invitation on the page that was mailed. */
    async join(link: string, { shopName, name, password }: { shopName: string; name: string; password: string }) {
      await page.goto(link);
      await page.getByLabel("Your name").fill(name);
      await page.getByLabel("Password").fill(password);
      await button(`Join ${shopName}`).click();
      await page.waitForURL(/\/bench$/);
    },
    async signIn({ email, password }: { email: string; password: string }) {
      await page.goto("/sign-in");
      await page.getByLabel("E-mail address").first().fill(email);
      await page.getByLabel("Password").fill(password);
      await button("Sign in").click();
      await page.waitForURL(/\/bench$/);
    },
    /** Opens the page of a mailed link without pressing its button. */
    async look(link: string) {
      await page.goto(link);
      await page.getByRole("heading", { level: 1 }).waitFor();
    },
    /** Presses the button of a mailed link and goes where it leads. */
    async openLink(link: string, shopName: string, leadsTo: RegExp) {
      await page.goto(link);
      await button(`Open ${shopName}`).click();
      await page.waitForURL(leadsTo);
    },
    heading: () => page.getByRole("heading", { level: 1 }),
  };
}
