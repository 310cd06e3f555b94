import type { Page } from "playwright-core";

export type ColourToBringIn = { colour: string; stock?: string; thickness?: string; hold?: string; solid?: boolean };

/** The mockup at its desk. */
export function mockup(page: Page) {
  const region = (name: string | RegExp) => page.getByRole("region", { name });
  const tools = page.getByRole("banner");
  const cell = (name: string) => page.getByLabel(name, { exact: true });
  const saved = () => tools.getByText(/^Saved /).waitFor();
  return {
    saved,
    cell,
    dryFit: () => region("Dry fit"),
    findings: (severity: "Stop" | "Caution" | "Remark") =>
      region("Dry fit").getByRole("listitem").filter({ hasText: severity }),
    issueButton: (letter: string) => tools.getByRole("button", { name: `Issue revision ${letter}` }),
    whyNot: () => page.locator("#why-not-to-issue"),
    undo: () => tools.getByRole("button", { name: "Undo" }),
    redo: () => tools.getByRole("button", { name: "Redo" }),
    rows: () => region("Schedule").getByRole("row"),
    raiseHandle: (key: string) => page.getByRole("slider", { name: new RegExp(`^Raise ${key},`) }),

    async addPlate(plate: {
      shape: string;
      name: string;
      width: string;
      height: string;
      stock: string;
      thickness: string;
      hold: string;
    }) {
      await page.getByRole("button", { name: "a plate" }).click();
      const dialog = page.getByRole("dialog", { name: "Add a plate" });
      await dialog.getByLabel("Shape").selectOption(plate.shape);
      await dialog.getByLabel("Name").fill(plate.name);
      await dialog.getByLabel("Width").fill(plate.width);
      await dialog.getByLabel("Height").fill(plate.height);
      await dialog.getByLabel("Stock").selectOption(plate.stock);
      await dialog.getByLabel("Thickness").selectOption(plate.thickness);
      await dialog.getByLabel("Held by").selectOption(plate.hold);
      await dialog.getByRole("button", { name: "Add the plate" }).click();
      await dialog.waitFor({ state: "detached" });
    },
    async bringIn(artwork: RegExp, colours: readonly ColourToBringIn[]) {
      await page.getByRole("group", { name: "Bring in" }).getByRole("button", { name: "artwork" }).click();
      const dialog = page.getByRole("dialog", { name: "Bring in artwork" });
      const choice = dialog.getByLabel("Artwork", { exact: true });
      await choice.waitFor();
      const name = (await choice.getByRole("option").allTextContents()).find((text) => artwork.test(text));
      await choice.selectOption(name ?? "");
      for (const { colour, stock, thickness, hold, solid = false } of colours) {
        if (stock) await dialog.getByLabel(`Stock of ${colour}`).selectOption(stock);
        if (thickness) await dialog.getByLabel(`Thickness, mm of ${colour}`).selectOption(thickness);
        if (hold) await dialog.getByLabel(`Held by of ${colour}`).selectOption(hold);
        if (solid) await dialog.getByLabel(`Close its openings of ${colour}`).check();
      }
      await dialog.getByRole("button", { name: /^Bring in \d+ layer/ }).click();
      await dialog.waitFor({ state: "detached" });
    },
    async chooseLayer(key: string) {
      await page.getByRole("button", { name: new RegExp(`^Choose ${key},`) }).click();
    },
    /** Writes into a cell of the schedule or of the lists below it, and leaves it. */
    async write(name: string, text: string) {
      await cell(name).fill(text);
      await cell(name).press("Enter");
    },
    async press(name: string) {
      await page.getByRole("button", { name, exact: true }).click();
    },
    /** Drags a layer of known thickness in the section, away from the wall by so many millimetres. */
    async raise(key: string, { thicknessMm, byMm }: { thicknessMm: number; byMm: number }) {
      const box = await page.getByRole("slider", { name: new RegExp(`^Raise ${key},`) }).boundingBox();
      if (box === null) throw new Error(`Layer ${key} can't be taken hold of in the section.`);
      // The handle lies round the layer with 4 px to spare on each side.
      const byPx = (byMm * (box.width - 8)) / thicknessMm;
      const [x, y] = [box.x + box.width / 2, box.y + box.height / 2];
      await page.mouse.move(x, y);
      await page.mouse.down();
      await page.mouse.move(x + byPx / 2, y, { steps: 4 });
      await page.mouse.move(x + byPx, y, { steps: 4 });
      await page.mouse.up();
    },
    /** Moves the chosen layer by arrow keys on the drawing, ten millimetres a press. */
    async nudge(key: string, arrow: "ArrowLeft" | "ArrowRight" | "ArrowUp" | "ArrowDown", presses: number) {
      await page.getByRole("button", { name: new RegExp(`^Choose ${key},`) }).click();
      await page.getByRole("application", { name: /elevation/i }).focus();
      for (let press = 0; press < presses; press++) await page.keyboard.press(`Shift+${arrow}`);
    },
    async issue(letter: string, message: string) {
      await tools.getByRole("button", { name: `Issue revision ${letter}` }).click();
      const dialog = page.getByRole("dialog", { name: `Issue revision ${letter}` });
      await dialog.getByLabel("Message to the client").fill(message);
      await dialog.getByRole("button", { name: `Issue ${letter}` }).click();
      await page.waitForURL(/\/sheets\//);
    },
  };
}
