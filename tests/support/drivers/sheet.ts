import type { Page } from "playwright-core";

export type NoteToAdd = { kind: "Must change" | "Question" | "Fine as is"; text: string; shopOnly?: boolean };

/** A revision as a drawing sheet, on the desk and in the hand. */
export function sheet(page: Page) {
  const notes = page.getByRole("region", { name: /^Notes/ });
  const viewer = page.getByRole("application", { name: /^Front elevation/ });
  const note = (number: number) =>
    notes
      .getByRole("listitem")
      .filter({ has: page.getByRole("button", { name: `Note ${number}: show on the drawing` }) });
  const approveDialog = page.getByRole("dialog", { name: /^Approve revision/ });
  return {
    viewer,
    note,
    approveDialog,
    titleBlock: () => page.getByLabel("Title block"),
    heading: () => page.getByRole("heading", { level: 1 }),
    reader: () => page.getByText(/You are reading as/),
    balloon: (number: number) => viewer.getByRole("button", { name: new RegExp(`^Note ${number}[,:]`) }),

    /** Waits until the revision is out and its drawing stands. */
    async isOut() {
      await viewer.getByRole("img", { name: "Front elevation" }).waitFor();
    },
    /** Touches a spot of the board, given as parts of its width and height, and writes a note about it. */
    async addNoteAt({ across, down }: { across: number; down: number }, { kind, text, shopOnly = false }: NoteToAdd) {
      await notes.getByRole("button", { name: "Add a note" }).click();
      await page.getByText("Touch the spot you mean.").waitFor();
      // The board has no role of its own: it is a shape of the drawing.
      const box = await viewer.locator('[data-id="board"]').first().boundingBox();
      if (box === null) throw new Error("The board is not in sight.");
      const spot = [box.x + box.width * across, box.y + box.height * down] as const;
      const touches = await page.evaluate(() => navigator.maxTouchPoints > 0);
      await (touches ? page.touchscreen.tap(...spot) : page.mouse.click(...spot));
      const form = page.getByRole("form", { name: "A new note" });
      await form.getByText(kind, { exact: true }).click();
      await form.getByLabel("Your note").fill(text);
      if (shopOnly) await form.getByLabel("Shop only").check();
      await form.getByRole("button", { name: "Add the note" }).click();
      await form.waitFor({ state: "detached" });
    },
    async reply(number: number, text: string) {
      await note(number)
        .getByRole("button", { name: `Reply to note ${number}`, exact: true })
        .click();
      await note(number).getByLabel(`Reply to note ${number}`, { exact: true }).fill(text);
      await note(number).getByRole("button", { name: "Send the reply" }).click();
      await note(number)
        .getByRole("list", { name: `Replies to note ${number}` })
        .getByText(text)
        .waitFor();
    },
    /** An answer that does not do: the note is open again. */
    async openAgain(number: number) {
      await note(number)
        .getByRole("button", { name: /^Open again/ })
        .click();
      await note(number).getByText("answered").waitFor({ state: "detached" });
    },
    async askForRevision(summary: string) {
      await page.getByRole("button", { name: "Ask for a revision" }).click();
      const dialog = page.getByRole("dialog", { name: /^Ask for a revision/ });
      await dialog.getByLabel(/Anything to add|What should change/).fill(summary);
      await dialog.getByRole("button", { name: "Ask for a revision" }).click();
      await dialog.waitFor({ state: "detached" });
    },
    async beginApproval(letter: string) {
      await page.getByRole("button", { name: new RegExp(`^Approve( revision ${letter})?$`) }).click();
      await approveDialog.waitFor();
    },
    /** The lines that the approver reads back. */
    acknowledgements: () => approveDialog.getByRole("group", { name: "What you approve" }).getByRole("checkbox"),
  };
}
