/** The one password of every demo account of staff. */
export const demoPassword = "copperlark-demo";

/**
 * The people of the demo shop. Staff sign in with their address and the demo password; the client's contact by a link
 * that the page "Outgoing mail" shows.
 * @type {readonly { role: "owner" | "maker" | "rep" | "client", email: string }[]}
 */
export const demoAccounts = [
  { role: "owner", email: "owner@copperlark.example" },
  { role: "maker", email: "maker@copperlark.example" },
  { role: "rep", email: "rep@copperlark.example" },
  { role: "client", email: "client@orrery.example" },
];

/**
 * What the start script says about them.
 * @returns {string[]} lines of text
 */
export function demoSignIns() {
  return demoAccounts.map(({ role, email }) =>
    role === "client"
      ? `  ${role.padEnd(7)} ${email} — by a link: ask for one on the sign-in page, then open it under "Outgoing mail" as the owner`
      : `  ${role.padEnd(7)} ${email}  password ${demoPassword}`,
  );
}
