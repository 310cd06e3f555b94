import type { Locator, Page } from "playwright-core";
import { type Hand, recordOfActions } from "./hand.ts";

/** More stops than lie between any two places of a screen. */
const mostStops = 200;

export type KeyHand = Hand & {
  /** How often Tab and F6 were pressed, forwards or backwards. */
  readonly stops: () => number;
};

/** A hand on the keys that never touches the mouse: Tab to get there, and there what the control answers to. */
export function keyHand(page: Page): KeyHand {
  const { actions, note } = recordOfActions();
  let stops = 0;
  // Files are asked for by the browser itself unless somebody listens, and Enter would be there before one who begins with it.
  page.on("filechooser", () => undefined);

  /** The key that brings the focus nearer to the target; null when it is there, to be seen; "wait" while a dialog is still to take it. */
  const keyTowards = (target: Locator) =>
    target.evaluate((element) => {
      if (element.matches(":focus-visible")) return null;
      const from = document.activeElement ?? document.body;
      const dialog = element.closest("[role=dialog]");
      if (dialog && !dialog.contains(from)) return "wait";
      const isBefore = (from.compareDocumentPosition(element) & Node.DOCUMENT_POSITION_PRECEDING) !== 0;
      // F6 goes from part to part of the desk, but not out of what lies over it.
      const part = from.closest("[role=dialog], [role=menu]") ? null : element.closest("header, [data-desk-part]");
      const key = part === null || part.contains(from) ? "Tab" : "F6";
      return isBefore ? `Shift+${key}` : key;
    });

  async function goTo(target: Locator): Promise<void> {
    await target.waitFor();
    for (let stop = 0; stop < mostStops; stop++) {
      const key = await keyTowards(target);
      if (key === null) return;
      if (key === "wait") {
        await page.waitForTimeout(50);
        continue;
      }
      await page.keyboard.press(key);
      stops++;
    }
    throw new Error(`The keyboard does not come to ${target} within ${mostStops} stops.`);
  }

  /** Of a group of radio buttons only the chosen one is a stop; arrows choose the others. */
  async function chooseRadio(target: Locator): Promise<void> {
    const chosen = page.locator(`input[name="${await target.getAttribute("name")}"]:checked`);
    await goTo(chosen);
    for (let step = 0; step < mostStops && !(await target.isChecked()); step++) await page.keyboard.press("ArrowDown");
  }

  /** A millimetre a press, as the bar says at first, and ten with Shift. */
  async function pressArrows(mm: number, [less, more]: readonly [string, string]): Promise<void> {
    const arrow = mm < 0 ? less : more;
    for (let left = Math.abs(mm); left >= 10; left -= 10) await page.keyboard.press(`Shift+${arrow}`);
    for (let left = Math.abs(mm) % 10; left > 0; left--) await page.keyboard.press(arrow);
  }

  async function write(target: Locator, text: string): Promise<void> {
    await note(`write “${text}” into`, target);
    await goTo(target);
    await page.keyboard.press("Control+A");
    await page.keyboard.type(text);
    await page.keyboard.press("Tab");
  }

  return {
    actions,
    stops: () => stops,
    async press(target) {
      await note("press", target);
      const type = await target.getAttribute("type");
      if (type === "radio") return chooseRadio(target);
      await goTo(target);
      await page.keyboard.press(type === "checkbox" ? "Space" : "Enter");
    },
    async pressAlso(target) {
      await note("press with Shift", target);
      await goTo(target);
      await page.keyboard.press("Shift+Enter");
    },
    write,
    async choose(target, option) {
      await note(`choose “${option}” in`, target);
      await goTo(target);
      const by = await target.evaluate((element, text) => {
        if (!(element instanceof HTMLSelectElement)) throw new Error("It is no list.");
        const wanted = [...element.options].findIndex((one) => one.label === text);
        if (wanted < 0) throw new Error(`The list has no ${text}.`);
        return wanted - element.selectedIndex;
      }, option);
      for (let step = 0; step < Math.abs(by); step++) await page.keyboard.press(by < 0 ? "ArrowUp" : "ArrowDown");
    },
    async move(elevation, { from, to }) {
      actions.push(`move by ${to.x - from.x} | ${to.y - from.y} mm`);
      await goTo(elevation);
      await pressArrows(to.x - from.x, ["ArrowLeft", "ArrowRight"]);
      await pressArrows(to.y - from.y, ["ArrowUp", "ArrowDown"]);
    },
    async give(opener, file) {
      await note("press", opener);
      actions.push(`give ${file.name}`);
      await goTo(opener);
      const asked = page.waitForEvent("filechooser");
      await page.keyboard.press("Enter");
      await (await asked).setFiles(file);
    },
  };
}

/** Listens for the mouse, a pen or a finger on a page, from its start on; says how often one was at work. */
export async function pointerWatch(page: Page): Promise<() => Promise<number>> {
  await page.addInitScript(() => {
    const seen = { count: 0 };
    Object.assign(window, { pointersSeen: seen });
    for (const kind of ["pointerdown", "pointermove", "mousedown", "mousemove", "wheel", "touchstart"])
      window.addEventListener(kind, ({ isTrusted }) => (seen.count += isTrusted ? 1 : 0), { capture: true });
  });
  return () => page.evaluate(() => (window as unknown as { pointersSeen: { count: number } }).pointersSeen.count);
}
