import type { Page } from "playwright-core";

/** Two letters side by side, and what changed in words. */
export function compare(page: Page) {
  const changes = page.getByRole("region", { name: /^From / });
  return {
    changes: () => changes.getByRole("listitem"),
    heading: () => changes.getByRole("heading"),
    picture: (letter: string) => page.getByRole("img", { name: `Revision ${letter}, front` }),
    /** Lets a change show on the pictures. */
    async show(words: RegExp) {
      await changes.getByRole("button", { name: words }).click();
    },
  };
}
