// @vitest-environment jsdom
import { act, useState } from "react";
import { describe, expect, it } from "vitest";
import { Button } from "@/components/ui/button.tsx";
import { ConfirmDialog } from "@/components/ui/confirm-dialog.tsx";
import { Dialog } from "@/components/ui/dialog.tsx";
import { button, press, render, until } from "../support/render.tsx";

function Harness({ kind }: { readonly kind: "dialog" | "question" }) {
  const [open, setOpen] = useState(false);
  const [isThere, setThere] = useState(true);
  return (
    <main tabIndex={-1}>
      {isThere && <Button onClick={() => setOpen(true)}>Open</Button>}
      {kind === "dialog" ? (
        <Dialog open={open} onOpenChange={setOpen} title="A sheet">
          <Button>Inside</Button>
        </Dialog>
      ) : (
        open && (
          <ConfirmDialog
            open
            onOpenChange={setOpen}
            title="Take it away?"
            action="Take it away"
            onConfirm={() => {
              setThere(false);
              setOpen(false);
            }}
          >
            <p>It is gone then.</p>
          </ConfirmDialog>
        )
      )}
    </main>
  );
}

async function openIt() {
  await act(async () => button("Open").focus());
  await press(button("Open"));
}

describe("dialogs", () => {
  it("give the focus back to what opened them", async () => {
    await render(<Harness kind="dialog" />);
    await openIt();
    await until(() => document.querySelector('[role="dialog"]')?.contains(document.activeElement));
    await press(button("Close"));
    await until(() => document.activeElement?.textContent === "Open");
    expect(document.querySelector('[role="dialog"]')).toBeNull();
  });

  it("give it back when an answer takes them off the page", async () => {
    await render(<Harness kind="question" />);
    await openIt();
    await press(button("Keep it"));
    await until(() => document.activeElement?.textContent === "Open");
  });

  it("give it to the main part when what opened them is gone", async () => {
    await render(<Harness kind="question" />);
    await openIt();
    await press(button("Take it away"));
    await until(() => document.activeElement?.tagName === "MAIN");
  });
});
