import type { Role } from "#shared/contracts/account.ts";

/** What each role is for, in a few words. */
export const roleWords: Record<Role, string> = {
  owner: "Owner: everything, the team and the shop's settings too",
  maker: "Maker: artwork, mockups, issuing",
  rep: "Rep: briefs, clients, portfolio; looks at mockups",
};
