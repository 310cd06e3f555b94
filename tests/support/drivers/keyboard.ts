import type { Locator, Page } from "playwright-core";

/** More stops than any screen has. */
const mostStops = 150;

/** A hand on the keys that never touches the mouse. */
export function keyboard(page: Page) {
  const travel = async (key: "Tab" | "Shift+Tab", target: Locator, presses: readonly string[]): Promise<void> => {
    await target.waitFor({ state: "attached" });
    for (let stop = 0; stop < mostStops; stop++) {
      // Where the hand is has to be seen as well.
      if (await target.evaluate((element) => element.matches(":focus-visible"))) {
        for (const press of presses) await page.keyboard.press(press);
        return;
      }
      await page.keyboard.press(key);
    }
    throw new Error(`The keyboard does not come to ${target}.`);
  };
  return {
    /** Goes on with Tab until the control is reached, then presses the keys on it. */
    go: (target: Locator, ...presses: string[]) => travel("Tab", target, presses),
    /** The same backwards. */
    back: (target: Locator, ...presses: string[]) => travel("Shift+Tab", target, presses),
  };
}
