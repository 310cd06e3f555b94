/** What is wrong with an entry of the stock list: the field, as a path within what was checked, and why, in words. */
export type StockFault = { readonly path: readonly (string | number)[]; readonly detail: string };
