import type { Page } from "playwright-core";
import type { GivenFile, Hand } from "./hand.ts";

/** Where pictures can be taken on the way. */
export type Moment = "empty" | "artwork" | "finished" | "issue";
type AtMoment = (moment: Moment) => Promise<void>;

/** Draws the sign of Orrery Books on an empty mockup of 600 by 400 mm, mends what the dry fit finds, and issues it. */
export async function drawOrrery(
  page: Page,
  { hand, artwork, at }: { hand: Hand; artwork: GivenFile; at: AtMoment },
): Promise<void> {
  const group = (name: string) => page.getByRole("group", { name, exact: true });
  const tool = (name: string) => page.getByRole("button", { name, exact: true });
  const layer = (key: string) => page.getByRole("button", { name: new RegExp(`^Choose ${key},`) });
  const dialog = (name: string) => page.getByRole("dialog", { name });
  const still = () => page.locator('section[aria-label="Dry fit"][aria-busy="false"]').waitFor();

  await still();
  await at("empty");

  const board = dialog("Board");
  await hand.press(tool("Board"));
  await hand.choose(board.getByLabel("Backer is"), "slats on a substrate");
  await hand.choose(board.getByLabel("Substrate"), "Birch plywood");
  await hand.choose(board.getByLabel("Its thickness"), "15");
  await hand.write(board.getByLabel("Thickness of a slat"), "6");
  await hand.press(board.getByRole("button", { name: "Take the best start" }));
  await hand.press(board.getByRole("group", { name: "Add" }).getByRole("button", { name: "clear coat" }));
  await hand.choose(board.getByLabel("Hung by"), "cleat");
  await hand.write(board.getByLabel("Gap behind the board"), "12");
  await hand.write(board.getByLabel("The wall’s fixing carries"), "20");
  await hand.press(board.getByRole("button", { name: "Change the board" }));
  await board.waitFor({ state: "detached" });

  const bringIn = dialog("Bring in artwork");
  await hand.press(group("Bring in").getByRole("button", { name: "artwork" }));
  await hand.give(bringIn.getByRole("button", { name: "Choose a file" }), artwork);
  await hand.press(bringIn.getByRole("button", { name: "Bring in 5 layers" }));
  await bringIn.waitFor({ state: "detached" });
  await still();
  await at("artwork");

  const plate = dialog("Add a plate");
  await hand.press(group("Bring in").getByRole("button", { name: "a plate" }));
  await hand.write(plate.getByLabel("Name"), "Night disc");
  await hand.write(plate.getByLabel("Diameter"), "264");
  await hand.choose(plate.getByLabel("Stock"), "Midnight");
  await hand.choose(plate.getByLabel("Thickness"), "6");
  await hand.choose(plate.getByLabel("Held by"), "Standoff 19 × 19");
  await hand.press(plate.getByRole("button", { name: "Add the plate" }));
  await plate.waitFor({ state: "detached" });

  // The disc comes under the rings, and its standoffs where no ring is.
  const lineUp = group("Line up");
  await hand.press(layer("B"));
  await hand.pressAlso(layer("G"));
  await hand.press(group("Set out").getByRole("button", { name: "line up" }));
  await hand.choose(lineUp.getByLabel("With"), "the first chosen");
  await hand.press(lineUp.getByRole("button", { name: "middle" }));
  await hand.press(lineUp.getByRole("button", { name: "Done" }));
  await hand.press(layer("G"));
  await hand.press(tool("Propose holes near the corners"));

  const lettering = dialog("Set lettering");
  await hand.press(group("Bring in").getByRole("button", { name: "lettering" }));
  await hand.press(lettering.getByRole("radio", { name: "Merriweather, black" }));
  await hand.choose(lettering.getByLabel("Stock"), "Midnight");
  await hand.choose(lettering.getByLabel("Thickness"), "4.5");
  await hand.press(lettering.getByRole("button", { name: "Set the words" }));
  await lettering.waitFor({ state: "detached" });
  // By the stem of the first R, from the middle of the board down to its lower edge.
  await still();
  const elevation = page.getByRole("application", { name: /elevation/i });
  await hand.move(elevation, { from: { x: 133, y: 200 }, to: { x: 133, y: 345 } });

  await mend(page, hand);
  await still();
  await at("finished");

  const issue = dialog("Issue revision A");
  await hand.press(tool("Issue revision A"));
  await hand.write(issue.getByLabel("Message to the client"), "Planets and rings stand off the slats.");
  await at("issue");
  await hand.press(issue.getByRole("button", { name: "Issue A" }));
  await page.waitForURL(/\/sheets\//);
}

const onAcrylic = ["B", "C", "D", "E", "F"] as const;

/** Findings that only the maker can decide on: the sheet comes in no greater thickness, and an offcut is on no list. */
const decisions = [
  ["Push and sag of G", "High over the counter: nobody leans on it."],
  ["Stock of E", "The offcut of the last job is large enough."],
] as const;

/** What the dry fit finds, done as it offers; what is left is for the maker to decide. */
async function mend(page: Page, hand: Hand): Promise<void> {
  const dryFit = page.getByRole("region", { name: "Dry fit" });
  const offered = (name: string) => dryFit.getByRole("button", { name, exact: true });
  for (const key of onAcrylic) await hand.press(offered(`Take Bodied cement: Adhesive of ${key}`));
  for (const key of onAcrylic) await hand.press(offered(`Plan a template: Locate of ${key}`));
  // Letters have islands, which would fall out of a template.
  await hand.press(offered("Plan a scored line: Locate of H"));
  for (const key of ["G", "H"]) await hand.press(offered(`Mark the film on the back: Face up of ${key}`));
  for (const [title, reason] of decisions) {
    await hand.press(offered(`Set aside: ${title}`));
    const form = dryFit.getByRole("form", { name: "Set aside" });
    await hand.write(form.getByLabel("Why it is set aside"), reason);
    await hand.press(form.getByRole("button", { name: "Set aside" }));
    await form.waitFor({ state: "detached" });
  }
}
