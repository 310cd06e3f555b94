import type { Locator, Page } from "playwright-core";
import { boardInWindow } from "../board-in-window.ts";

export type GivenFile = { readonly name: string; readonly mimeType: string; readonly buffer: Buffer };

type OnBoard = { readonly x: number; readonly y: number };

/** What a person does at a screen, one action at a time, with a record of it. */
export type Hand = {
  /** Every action so far, in words. */
  readonly actions: readonly string[];
  readonly press: (target: Locator) => Promise<void>;
  /** Presses with Shift held, which adds to what is chosen. */
  readonly pressAlso: (target: Locator) => Promise<void>;
  /** Writes over what is in a field, and leaves it. */
  readonly write: (target: Locator, text: string) => Promise<void>;
  /** Chooses the option of a list that reads so. */
  readonly choose: (target: Locator, option: string) => Promise<void>;
  /** Moves what is chosen and lies at one place of the board to another, whole mm. */
  readonly move: (elevation: Locator, way: { readonly from: OnBoard; readonly to: OnBoard }) => Promise<void>;
  /** Presses what asks for a file, and gives it: two actions. */
  readonly give: (opener: Locator, file: GivenFile) => Promise<void>;
};

/** What is done, in the words that the screen has for it. */
export function recordOfActions() {
  const actions: string[] = [];
  return {
    actions,
    async note(does: string, target: Locator): Promise<void> {
      const name = await target.evaluate((element) => {
        const isField =
          element instanceof HTMLInputElement ||
          element instanceof HTMLSelectElement ||
          element instanceof HTMLTextAreaElement;
        const label = isField ? element.labels?.[0]?.textContent : null;
        return element.getAttribute("aria-label") ?? label ?? element.textContent ?? "";
      });
      actions.push(`${does} ${name.trim()}`);
    },
  };
}

/** A hand on the mouse, which goes to the keys for what is written. */
export function pointerHand(page: Page): Hand {
  const { actions, note } = recordOfActions();
  return {
    actions,
    async press(target) {
      await note("press", target);
      await target.click();
    },
    async pressAlso(target) {
      await note("press with Shift", target);
      await target.click({ modifiers: ["Shift"] });
    },
    async write(target, text) {
      await note(`write “${text}” into`, target);
      await target.click();
      await page.keyboard.press("Control+A");
      await page.keyboard.type(text);
      await page.keyboard.press("Tab");
    },
    async choose(target, option) {
      await note(`choose “${option}” in`, target);
      await target.selectOption({ label: option });
    },
    async move(elevation, { from, to }) {
      actions.push(`drag from ${from.x} | ${from.y} mm to ${to.x} | ${to.y} mm`);
      await elevation.scrollIntoViewIfNeeded();
      const at = await boardInWindow(elevation);
      await page.mouse.move(...at(from.x, from.y));
      await page.mouse.down();
      await page.mouse.move(...at((from.x + to.x) / 2, (from.y + to.y) / 2), { steps: 4 });
      await page.mouse.move(...at(to.x, to.y), { steps: 4 });
      await page.mouse.up();
    },
    async give(opener, file) {
      await note("press", opener);
      actions.push(`give ${file.name}`);
      const asked = page.waitForEvent("filechooser");
      await opener.click();
      await (await asked).setFiles(file);
    },
  };
}
