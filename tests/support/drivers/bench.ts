import type { Page } from "playwright-core";

/** A staff member's home: the jobs by whose move it is. */
export function bench(page: Page) {
  return {
    async openJob({ client, title, dueOn }: { client: string; title: string; dueOn: string }) {
      await page.getByRole("banner").getByRole("button", { name: "Open a job" }).click();
      const dialog = page.getByRole("dialog", { name: "Open a job" });
      await dialog.getByLabel("Client").selectOption(client);
      await dialog.getByLabel("What the sign is").fill(title);
      await dialog.getByLabel("Due on").fill(dueOn);
      await dialog.getByRole("button", { name: "Open the job" }).click();
      await page.getByRole("heading", { level: 1, name: title }).waitFor();
    },
    /** The rows under "Our move", "The client's move" or "Nobody's move". */
    group: (title: string) =>
      page
        .locator("section")
        .filter({ has: page.getByRole("heading", { name: title }) })
        .getByRole("listitem"),
    async openRow(client: string) {
      await page.getByRole("link", { name: client }).click();
    },
  };
}
