import { onEnd } from "./ending.ts";
import { readEnvironment } from "./env.ts";
import { runQueue } from "./jobs/run-queue.ts";
import { openServices } from "./services.ts";

const { services, close } = await openServices(readEnvironment(process.env));
const queue = await runQueue(services);
services.log.info("Working on the queue");

onEnd(services.log, async () => {
  await queue.stop();
  await close();
});
