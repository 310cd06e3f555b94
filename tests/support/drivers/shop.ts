import type { Page } from "playwright-core";

/** What the shop's own people do beside jobs: team, clients, and the way between the places. */
export function shop(page: Page) {
  const go = (place: string) =>
    page.getByRole("navigation", { name: "Shop" }).getByRole("link", { name: place }).click();
  return {
    go,
    async invite({ email, role }: { email: string; role: string }) {
      await go("Team");
      const form = page.getByRole("region", { name: "Invite someone" });
      await form.getByLabel("E-mail address").fill(email);
      await form.getByLabel("Role").selectOption(role);
      await form.getByRole("button", { name: "Send the invitation" }).click();
      await form.getByText(`An invitation is on its way to ${email}.`).waitFor();
    },
    async addClient({ name, contact }: { name: string; contact: { name: string; email: string } }) {
      await go("Clients");
      await page.getByRole("button", { name: "Add a client" }).click();
      const client = page.getByRole("dialog", { name: "Add a client" });
      await client.getByLabel("Name of the company").fill(name);
      await client.getByRole("button", { name: "Add the client" }).click();
      await page.getByRole("heading", { level: 1, name }).waitFor();
      await page.getByRole("button", { name: "Add a contact" }).click();
      const person = page.getByRole("dialog", { name: `Add a contact of ${name}` });
      await person.getByLabel("Name").fill(contact.name);
      await person.getByLabel("E-mail address").fill(contact.email);
      await person.getByRole("button", { name: "Add the contact" }).click();
      await page.getByText(`${contact.name} is added.`).waitFor();
    },
  };
}
