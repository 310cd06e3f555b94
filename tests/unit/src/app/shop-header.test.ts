import { describe, expect, it } from "vitest";
import { placesOf } from "@/app/shop-header.tsx";

const all = {
  changeShop: true,
  manageTeam: true,
  openJob: true,
  seeClients: true,
  seeStock: true,
  changeStock: true,
  seePrices: true,
  seePortfolio: true,
  sharePortfolio: true,
  seeOutgoingMail: true,
};
const shop = {
  slug: "s",
  name: "S",
  unit: "mm",
  jobPrefix: "S",
  paper: "A4",
  timeZone: "UTC",
  buildDays: 5,
  freightDays: 2,
  demo: false,
  can: all,
} as const;
const labels = (reader: Parameters<typeof placesOf>[0]) => placesOf(reader).map(({ label }) => label);

describe("placesOf", () => {
  it("shows an owner everything, in the order of a day's work", () => {
    expect(labels({ shop, side: "shop" })).toEqual([
      "Bench",
      "Clients",
      "Stock",
      "Prices",
      "Portfolio",
      "Team",
      "Shop",
      "Outgoing mail",
    ]);
  });
  it("leaves out what the reader may not open", () => {
    const can = { ...all, manageTeam: false, changeShop: false, seeOutgoingMail: false, seePrices: false };
    expect(labels({ shop: { ...shop, can }, side: "shop" })).toEqual(["Bench", "Clients", "Stock", "Portfolio"]);
  });
  it("shows a client their own signs only, whatever the shop's answer says", () => {
    expect(labels({ shop, side: "client" })).toEqual(["Your signs"]);
  });
});
