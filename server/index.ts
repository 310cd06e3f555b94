import { createServer } from "node:http";
import { createApp } from "./app.ts";
import { onEnd } from "./ending.ts";
import { readEnvironment } from "./env.ts";
import { runQueue } from "./jobs/run-queue.ts";
import { openServices } from "./services.ts";

const env = readEnvironment(process.env);
const { services, close } = await openServices(env);
const { log } = services;
const queue = env.WORKER === "inside" ? await runQueue(services) : null;
const server = createServer(createApp(services).handler);

await new Promise<void>((resolve, reject) => {
  server.once("error", reject);
  server.listen(env.PORT, env.HOST, resolve);
});
log.info({ address: server.address(), publicUrl: env.PUBLIC_URL, worker: env.WORKER }, "Listening");

onEnd(log, async () => {
  // Browsers keep connections open; each is closed once its request is answered.
  await services.watchers.close();
  const idle = setInterval(() => server.closeIdleConnections(), 100);
  await new Promise<void>((resolve) => server.close(() => resolve()));
  clearInterval(idle);
  await queue?.stop();
  await close();
});
