import type { Page } from "playwright-core";

/** The pieces a shop may show, and the links to them. */
export function portfolio(page: Page) {
  const links = page.getByRole("region", { name: "Links" });
  return {
    link: (label: string) => links.getByRole("listitem").filter({ hasText: label }),
    /** Makes a link to one piece and reads its address, which is shown this once. */
    async makeLink({ piece, label }: { piece: string; label: string }): Promise<string> {
      await page.getByRole("button", { name: "Make a link" }).click();
      await page.getByLabel("Whom is it for?").fill(label);
      await page.getByLabel(`Show ${piece}`).check();
      await page.getByRole("button", { name: "Make the link" }).click();
      const address = await page.getByLabel("Address of the link").inputValue();
      await page.getByRole("button", { name: "Done" }).click();
      return new URL(address).pathname;
    },
    async closeLink(label: string) {
      await links.getByRole("button", { name: `Close the link for ${label}` }).click();
      await page
        .getByRole("alertdialog")
        .or(page.getByRole("dialog"))
        .getByRole("button", { name: "Close the link" })
        .click();
      await links.getByRole("listitem").filter({ hasText: label }).getByText("closed").waitFor();
    },
  };
}
