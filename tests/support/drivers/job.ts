import type { Page } from "playwright-core";

export type BriefToFill = {
  words: string;
  width: string;
  height: string;
  place: string;
  distance: string;
  approver: string;
};

/** The page of one job. */
export function job(page: Page) {
  const region = (name: string) => page.getByRole("region", { name });
  const artwork = (name: string) => region("Artwork").getByRole("listitem").filter({ hasText: name });
  return {
    nextStep: () => region("Next step"),
    revision: (letter: string) =>
      region("Revisions")
        .getByRole("listitem")
        .filter({ hasText: `Revision ${letter}:` }),
    artwork,
    log: () => region("Log").getByRole("listitem"),
    consent: () => region("Portfolio"),
    async fillBrief({ words, width, height, place, distance, approver }: BriefToFill) {
      const brief = region("Brief");
      await brief.getByLabel("The words exactly as they shall read").fill(words);
      await brief.getByLabel("Width").fill(width);
      await brief.getByLabel("Height").fill(height);
      await brief.getByLabel("Place").selectOption(place);
      await brief.getByLabel("Read from how far").fill(distance);
      await brief.getByLabel(approver).check();
      await brief.getByRole("button", { name: "Save the brief" }).click();
      await brief.getByText("Saved.", { exact: true }).waitFor();
    },
    /** Brings in a file and waits until it has become pieces. */
    async bringIn({ name, content }: { name: string; content: Buffer }) {
      await page.getByLabel("Artwork file").setInputFiles({ name, mimeType: "image/svg+xml", buffer: content });
      await artwork(name).getByRole("button", { name: "Set the true size" }).waitFor();
    },
    async setTrueSize(name: string, { side, length }: { side: "Width" | "Height"; length: string }) {
      const item = artwork(name);
      await item.getByRole("button", { name: "Set the true size" }).click();
      await item.getByLabel("Known side").selectOption({ label: `${side} of the page` });
      await item.getByLabel("True length").fill(length);
      await item.getByRole("button", { name: "Set the true size" }).click();
      await item.getByLabel("True length").waitFor({ state: "detached" });
    },
    async openMockup() {
      await region("Next step")
        .getByRole("link", { name: /mockup/ })
        .click();
      await page.getByRole("region", { name: "Schedule" }).waitFor();
    },
    async openSheet(letter: string) {
      await region("Revisions")
        .getByRole("link", { name: `Sheet of revision ${letter}` })
        .click();
      await page.waitForURL(/\/sheets\//);
    },
  };
}
