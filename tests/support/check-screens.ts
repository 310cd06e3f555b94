import { mkdir } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import AxeBuilder from "@axe-core/playwright";
import { afterAll, beforeAll, expect, it, onTestFailed } from "vitest";
import { type ScreenStage, setScreenStage } from "./screen-stage.ts";
import { screens, type Who } from "./screen-table.ts";
import { type SeatSize, sizes } from "./seat.ts";

const folder = join(tmpdir(), "standproud-screens");

/**
 * A test for every screen of the application with the demo shop in it that these people see, at one size: it comes, nothing is wider than the window, the
 * console is silent and axe finds nothing grave. With SCREENS=1 each is kept as a picture. Gives the stage for more.
 */
export function checkScreens(size: SeatSize, whose: (who: Who) => boolean = () => true): () => ScreenStage {
  let stage: ScreenStage;

  beforeAll(async () => {
    stage = await setScreenStage();
    await mkdir(folder, { recursive: true });
  }, 180_000);

  afterAll(async () => {
    await stage?.stop();
  });

  const shown = screens.filter(({ who, only = size }) => only === size && whose(who));
  it.each(shown)("$who sees $name as it should be", async (screen) => {
    const { page, faults } = await stage.seatOf(screen.who, size);
    const before = faults.length;
    const path = join(folder, `${size}-${screen.who}-${screen.name}.png`);
    onTestFailed(async () => {
      await page.screenshot({ path });
    });
    await page.goto(screen.path());
    await screen.ready(page).waitFor();
    await screen.open?.(page);
    await page.evaluate(() => document.fonts.ready);
    if (process.env.SCREENS) await page.screenshot({ path, fullPage: !screen.open });
    expect(faults.slice(before)).toEqual([]);
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(sizes[size].width);
    const { violations } = await new AxeBuilder({ page }).setLegacyMode().analyze();
    const grave = violations.filter(({ impact }) => impact === "serious" || impact === "critical");
    expect(grave.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(" ")}`)).toEqual([]);
  });

  return () => stage;
}
