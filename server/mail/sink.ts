/** A mail as the local sink caught it. */
export type CaughtMail = {
  readonly id: string;
  readonly from: string;
  readonly to: string;
  readonly subject: string;
  readonly at: Date;
  readonly text: string;
};

/**
 * A mail server on loopback that keeps what it is given instead of passing it on. It may catch the mail of several
 * shops, with links that sign people in, so every read names the shop whose mail is meant.
 */
export type MailSink = {
  /** smtp://127.0.0.1:port */
  readonly url: string;
  /** Newest first. `before` is the id of the last row of the page before. */
  readonly list: (page: {
    readonly shopId: string;
    readonly limit: number;
    readonly before: string | null;
  }) => Promise<readonly CaughtMail[]>;
  readonly find: (mail: { readonly shopId: string; readonly id: string }) => Promise<CaughtMail | null>;
  readonly close: () => Promise<void>;
};

/** Names the shop that a mail is from, for the sink only. */
export const shopHeader = "x-standproud-shop";
