import { hashPassword } from "../../auth/passwords.ts";
import type { Services } from "../../http/context.ts";
import { Shop } from "../../models/shop.ts";
import { demoPassword } from "../../start/demo-accounts.mjs";
import { loadDemoPeople } from "./load-demo-people.ts";
import { loadDemoWork } from "./load-demo-work.ts";

/** Loads the demo shop into a database without a shop, all of it or nothing. Says whether it did. */
export async function loadDemo(services: Services): Promise<boolean> {
  const passwordHash = await hashPassword(demoPassword);
  return services.sequelize.transaction(async (transaction) => {
    // Two starts at once must not both find no shop.
    await services.sequelize.query("select pg_advisory_xact_lock(hashtext('standproud demo'))", { transaction });
    if ((await Shop.count({ transaction })) > 0) return false;
    const { context, ids } = await loadDemoPeople(services, { transaction, now: new Date(), passwordHash });
    await loadDemoWork(context, ids);
    return true;
  });
}
