// @vitest-environment jsdom
import { expect, it, vi } from "vitest";
import { Button } from "@/components/ui/button.tsx";
import { button, press, render } from "../support/render.tsx";

it("takes no second press while its work is under way, and stays reachable by keyboard", async () => {
  const handlePress = vi.fn();
  const handleSubmit = vi.fn((event: { preventDefault: () => void }) => event.preventDefault());
  const form = (busy: boolean) => (
    <form onSubmit={handleSubmit}>
      <Button type="submit" busy={busy} onClick={handlePress}>
        Send
      </Button>
    </form>
  );
  const { redraw } = await render(form(false));
  await press(button("Send"));
  expect([handlePress.mock.calls.length, handleSubmit.mock.calls.length]).toEqual([1, 1]);
  await redraw(form(true));
  await press(button("Send"));
  expect([handlePress.mock.calls.length, handleSubmit.mock.calls.length]).toEqual([1, 1]);
  expect(button("Send").getAttribute("aria-busy")).toBe("true");
  expect(button("Send").disabled).toBe(false);
});
