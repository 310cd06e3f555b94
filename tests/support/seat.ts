import type { Browser, BrowserContext, ConsoleMessage, Page } from "playwright-core";
import { patienceMs } from "./served-app.ts";

/** A desk in the workshop and a phone in the hand. */
export const sizes = { desk: { width: 1440, height: 900 }, phone: { width: 390, height: 844 } } as const;
export type SeatSize = keyof typeof sizes;

export type Seat = {
  readonly page: Page;
  readonly context: BrowserContext;
  /** Errors that pages threw or wrote to the console, each with its page's address. */
  readonly faults: readonly string[];
  /** Opens an address of the application. */
  readonly open: (path: string) => Promise<void>;
  readonly leave: () => Promise<void>;
};

/** The browser's own line about an answer that is no success; whether that was right is for the test to say. */
const isAboutAnAnswer = (message: ConsoleMessage): boolean =>
  message.text().startsWith("Failed to load resource: the server responded with a status of 4");

/** Someone in front of a screen: cookies of their own, and an ear for what the page complains of. */
export async function takeSeat(
  browser: Browser,
  { baseUrl, size, storageState }: { baseUrl: string; size: SeatSize; storageState?: StorageState },
): Promise<Seat> {
  const context = await browser.newContext({
    baseURL: baseUrl,
    viewport: sizes[size],
    acceptDownloads: true,
    locale: "en-GB",
    timezoneId: "Europe/London",
    ...(size === "phone" ? { hasTouch: true, isMobile: true } : {}),
    ...(storageState ? { storageState } : {}),
  });
  context.setDefaultTimeout(patienceMs);
  const faults: string[] = [];
  context.on("weberror", (error) => faults.push(`${error.page()?.url()} threw ${error.error()}`));
  context.on("console", (message) => {
    if (message.type() !== "error" || isAboutAnAnswer(message)) return;
    faults.push(`${message.page()?.url()} complained: ${message.text()}`);
  });
  const page = await context.newPage();
  return {
    page,
    context,
    faults,
    open: async (path) => {
      await page.goto(path);
    },
    leave: () => context.close(),
  };
}

export type StorageState = Awaited<ReturnType<BrowserContext["storageState"]>>;
