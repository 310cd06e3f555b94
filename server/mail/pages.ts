/** Addresses that mails lead to, named as src/app/paths.ts names them (a test compares the two). */
export const pages = {
  link: (token: string): string => `/link/${token}`,
  bench: (shop: string): string => `/shop/${shop}/bench`,
  unsubscribe: (token: string): string => `/unsubscribe/${token}`,
  sheet: (shop: string, revisionId: string): string => `/shop/${shop}/sheets/${revisionId}`,
} as const;
