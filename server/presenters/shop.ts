import type { z } from "zod";
import type { shopSchema } from "#shared/contracts/shop.ts";
import type { Shop } from "../models/shop.ts";
import type { Actor } from "../policies/actor.ts";
import { clientPolicy } from "../policies/client.ts";
import { jobPolicy } from "../policies/job.ts";
import { portfolioPolicy } from "../policies/portfolio.ts";
import { pricesPolicy } from "../policies/prices.ts";
import { shopPolicy } from "../policies/shop.ts";
import { stockPolicy } from "../policies/stock.ts";
import { teamPolicy } from "../policies/team.ts";

/** `keepsMail`: whether mail goes to the local sink. */
export function presentShop(
  actor: Actor,
  { id: shopId, slug, name, unit, jobPrefix, paper, timeZone, buildDays, freightDays, demo }: Shop,
  { keepsMail }: { keepsMail: boolean },
): z.input<typeof shopSchema> {
  return {
    slug,
    name,
    unit,
    jobPrefix,
    paper,
    timeZone,
    buildDays,
    freightDays,
    demo,
    can: {
      changeShop: shopPolicy.change(actor, { shopId }),
      manageTeam: teamPolicy.invite(actor, { shopId }),
      openJob: jobPolicy.open(actor),
      seeClients: clientPolicy.list(actor),
      seeStock: stockPolicy.see(actor),
      changeStock: stockPolicy.change(actor),
      seePrices: pricesPolicy.see(actor, { shopId }),
      seePortfolio: portfolioPolicy.see(actor),
      sharePortfolio: portfolioPolicy.share(actor),
      seeOutgoingMail: shopPolicy.seeOutgoingMail(actor, { shopId, keepsMail }),
    },
  };
}
