import { loadDemo } from "./db/demo/load-demo.ts";
import { migrate } from "./db/migrate.ts";
import { readEnvironment } from "./env.ts";
import { createLog } from "./log.ts";
import { openServices } from "./services.ts";

const env = readEnvironment(process.env);
const log = createLog(env);
await migrate({
  ownerUrl: env.DATABASE_URL,
  appRole: env.APP_DATABASE_URL ? decodeURIComponent(new URL(env.APP_DATABASE_URL).username) : undefined,
});
log.info("The database is up to date");

if (env.DEMO === "auto") {
  const { services, close } = await openServices(env, { log });
  try {
    if (await loadDemo(services)) log.info("Loaded the demo shop");
  } finally {
    await close();
  }
}
