/** A mail as the local sink caught it. */
export type CaughtMail = {
  readonly id: string;
  readonly from: string;
  readonly to: string;
  readonly subject: string;
  readonly at: Date;
  readonly text: string;
};

/** A mail server on loopback that keeps what it is given instead of passing it on. */
export type MailSink = {
  /** smtp://127.0.0.1:port */
  readonly url: string;
  /** Newest first. `before` is the id of the last row of the page before. */
  readonly list: (page: { readonly limit: number; readonly before: string | null }) => Promise<readonly CaughtMail[]>;
  readonly find: (id: string) => Promise<CaughtMail | null>;
  readonly close: () => Promise<void>;
};
