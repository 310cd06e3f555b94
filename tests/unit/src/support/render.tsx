import { act, type ReactNode } from "react";
import { createRoot } from "react-dom/client";

declare global {
  var IS_REACT_ACT_ENVIRONMENT: boolean;
}
globalThis.IS_REACT_ACT_ENVIRONMENT = true;

/** Draws into a fresh element of the page. The root is given back so that a test can draw again or take it away. */
export async function render(node: ReactNode) {
  const element = document.createElement("div");
  document.body.replaceChildren(element);
  const root = createRoot(element);
  await act(async () => root.render(node));
  return {
    element,
    redraw: (next: ReactNode) => act(async () => root.render(next)),
    end: () => act(async () => root.unmount()),
  };
}

const nameOf = (element: Element): string =>
  (element.getAttribute("aria-label") ?? element.textContent ?? "").replace(/\s+/g, " ").trim();

/** The button of that name. Throws with the names there are. */
export function button(name: string): HTMLButtonElement {
  const buttons = [...document.querySelectorAll("button")];
  const found = buttons.find((candidate) => nameOf(candidate) === name);
  if (!found) throw new Error(`no button "${name}" among: ${buttons.map(nameOf).join(", ")}`);
  return found;
}

/** The control of that label. */
export function field(label: string): HTMLInputElement {
  const labels = [...document.querySelectorAll("label")];
  const found = labels.find((candidate) => candidate.textContent?.trim() === label);
  const control = found && document.getElementById(found.htmlFor);
  if (!(control instanceof HTMLInputElement)) throw new Error(`no input is labelled "${label}"`);
  return control;
}

export const press = (element: HTMLElement) => act(async () => element.click());

/** Types as a person does: focus, the text, and on to the next control. */
export async function type(input: HTMLInputElement, text: string) {
  await act(async () => input.focus());
  await act(async () => {
    // React listens to the element's own setter, so the text goes in past it.
    Object.getOwnPropertyDescriptor(HTMLInputElement.prototype, "value")?.set?.call(input, text);
    input.dispatchEvent(new Event("input", { bubbles: true }));
  });
  await act(async () => input.blur());
}

/** Waits until `found` gives something, looking again after each turn of the event loop; throws after 3 s. */
export async function until<T>(found: () => T | null | undefined | false): Promise<T> {
  const end = Date.now() + 3000;
  while (Date.now() < end) {
    const value = found();
    if (value) return value;
    await act(async () => {
      await new Promise((resolve) => setTimeout(resolve, 10));
    });
  }
  throw new Error(`waited in vain; the page says: ${document.body.textContent}`);
}
