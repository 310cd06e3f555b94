import { describe, expect, it } from "vitest";
import { Revision } from "#server/models/revision.ts";
import { paths } from "@/app/paths.ts";
import { checkScreens } from "../support/check-screens.ts";
import { keyboard } from "../support/drivers/keyboard.ts";
import { sheet } from "../support/drivers/sheet.ts";
import { screens, sheetOf, shop } from "../support/screen-table.ts";

it("leaves no address out", () => {
  expect(new Set(screens.map(({ at }) => at))).toEqual(new Set(Object.keys(paths)));
});

const stage = checkScreens("desk");

describe("by keyboard alone", () => {
  it("lets an approver leave a note at a piece, settle it and approve", async () => {
    const { page, faults } = await stage().seatOf("captain", "desk");
    const keys = keyboard(page);
    const notes = page.getByRole("region", { name: /^Notes/ });
    await page.goto(paths.sheet(shop, sheetOf("137 B")));
    await sheet(page).isOut();
    await keys.go(notes.getByRole("button", { name: "Add a note" }), "Enter");
    const form = page.getByRole("form", { name: "A new note" });
    // The list begins with nothing chosen, then the whole sign, then the pieces.
    await keys.go(form.getByLabel("or choose from the list"), "ArrowDown", "ArrowDown");
    // Backwards a group that has nothing chosen is entered at its end; the next arrow comes round to its beginning.
    await keys.back(form.getByRole("radio").last(), "ArrowRight");
    await keys.go(form.getByLabel("Your note"));
    await page.keyboard.type("Is the blade long enough?");
    await keys.go(form.getByRole("button", { name: "Add the note" }), "Enter");
    await sheet(page).note(1).getByText("Is the blade long enough?").waitFor();
    expect(await sheet(page).note(1).textContent()).toMatch(/Must change, zone [A-Z]\d+, Piece 1 on layer B/);
    // The form is gone: the hand goes on from the new line.
    await sheet(page).note(1).locator("button:focus").waitFor();

    await keys.go(page.getByRole("button", { name: "Approve revision B" }), "Enter");
    const { approveDialog, acknowledgements } = sheet(page);
    await approveDialog.waitFor();
    for (const line of await acknowledgements().all()) await keys.go(line, "Space");
    await keys.go(approveDialog.getByLabel("Settled: this drawing does it"), "Space");
    await keys.go(approveDialog.getByLabel("Your name, typed as your signature"));
    await page.keyboard.type("Aurel Brandt");
    await keys.go(approveDialog.getByRole("button", { name: "Approve revision B" }), "Enter");
    await page.getByText("Revision B is approved.").waitFor();
    expect(await Revision.findByPk(sheetOf("137 B"))).toMatchObject({ state: "approved" });
    expect(faults).toEqual([]);
  });
});
