import { describe, expect, it } from "vitest";
import type { Me } from "#shared/contracts/account.ts";
import type { Shop } from "#shared/contracts/shop.ts";
import { readerOf } from "@/lib/shop-context.ts";

const no = {
  changeShop: false,
  manageTeam: false,
  openJob: false,
  seeClients: false,
  seeStock: false,
  changeStock: false,
  seePrices: false,
  seePortfolio: false,
  sharePortfolio: false,
  seeOutgoingMail: false,
};
const shop: Shop = {
  slug: "copperlark-signs",
  name: "Copperlark Signs",
  unit: "mm",
  jobPrefix: "CL",
  paper: "A4",
  timeZone: "UTC",
  buildDays: 5,
  freightDays: 2,
  demo: true,
  can: no,
};
const person = {
  id: "00000000-0000-4000-8000-000000000001",
  name: "Ida Fenn",
  email: "ida@saltgrass.example",
  hasPassword: true,
};
const member = { shop: "copperlark-signs", shopName: "Copperlark Signs", role: "maker" } as const;
const contact = { shop: "copperlark-signs", shopName: "Copperlark Signs", client: "Saltgrass Rowing Club" };
const me = (change: Partial<Me>): Me => ({ person, session: "password", memberOf: [], contactOf: [], ...change });

describe("readerOf", () => {
  it("takes a member for the shop", () => {
    expect(readerOf(me({ memberOf: [member], contactOf: [contact] }), shop)).toMatchObject({
      side: "shop",
      role: "maker",
    });
  });
  it("takes whoever came by a mailed link for the client, a member too", () => {
    expect(readerOf(me({ session: "link", memberOf: [member], contactOf: [contact] }), shop)).toMatchObject({
      side: "client",
      role: null,
      client: "Saltgrass Rowing Club",
    });
  });
  it("is nobody in a shop where the person has no part", () => {
    expect(readerOf(me({ memberOf: [{ ...member, shop: "elsewhere" }] }), shop)).toBeNull();
    expect(readerOf(me({ session: "link", memberOf: [member] }), shop)).toBeNull();
    expect(readerOf(me({ person: null, memberOf: [member] }), shop)).toBeNull();
  });
});
