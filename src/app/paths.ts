/** Every address of the application. Components never build one by hand. */
export const paths = {
  home: () => "/",
  signIn: () => "/sign-in",
  register: () => "/register",
  forgotPassword: () => "/forgot-password",
  /** Where mailed links lead: sign in, join a shop, new password. A page with a button, since scanners open links too. */
  link: (token: string) => `/link/${token}`,
  /** Where the foot of a mail leads to stop mails like it. */
  unsubscribe: (token: string) => `/unsubscribe/${token}`,
  account: () => "/account",
  share: (token: string) => `/share/${token}`,
  bench: (shop: string) => `/shop/${shop}/bench`,
  /** With the artwork whose tracing is to be open. */
  job: (shop: string, jobId: string, tracing?: string) =>
    `/shop/${shop}/jobs/${jobId}${tracing === undefined ? "" : `?trace=${tracing}#artwork`}`,
  mockup: (shop: string, jobId: string) => `/shop/${shop}/jobs/${jobId}/mockup`,
  cutPlan: (shop: string, jobId: string) => `/shop/${shop}/jobs/${jobId}/cut-plan`,
  compare: (shop: string, jobId: string, before: string, after: string) =>
    `/shop/${shop}/jobs/${jobId}/compare?before=${before}&after=${after}`,
  sheet: (shop: string, revisionId: string) => `/shop/${shop}/sheets/${revisionId}`,
  clients: (shop: string) => `/shop/${shop}/clients`,
  client: (shop: string, clientId: string) => `/shop/${shop}/clients/${clientId}`,
  portfolio: (shop: string) => `/shop/${shop}/portfolio`,
  stock: (shop: string) => `/shop/${shop}/stock`,
  /** With things that are to be given a price, each as its group, id and name. */
  prices: (shop: string, wanted: readonly { group: string; id: string; name: string }[] = []) =>
    `/shop/${shop}/prices${wanted.length === 0 ? "" : `?${wantedQuery(wanted)}`}`,
  team: (shop: string) => `/shop/${shop}/team`,
  shop: (shop: string) => `/shop/${shop}/shop`,
  limits: (shop: string) => `/shop/${shop}/limits`,
  outgoingMail: (shop: string) => `/shop/${shop}/outgoing-mail`,
  /** All calculations, or one of them by its id. */
  howWeWorkItOut: (shop: string, calculation?: string) =>
    `/shop/${shop}/how-we-work-it-out${calculation === undefined ? "" : `#${calculation}`}`,
} as const;

const wantedQuery = (wanted: readonly { group: string; id: string; name: string }[]): string =>
  new URLSearchParams(wanted.map(({ group, id, name }) => ["wanted", JSON.stringify([group, id, name])])).toString();

/** Sign-in that leads back to where the reader was going. */
export const signInTo = (next: string): string => `${paths.signIn()}?next=${encodeURIComponent(next)}`;

/** A way back is taken only when it stays within this application. */
export const localPath = (next: string | null): string | null =>
  next !== null && /^\/(?![/\\])[^\\\s]*$/.test(next) && !next.startsWith(paths.signIn()) ? next : null;
