import { startDurableCluster } from "../../server/start/postgres.mjs";

// Run by tests/db/cluster.test.ts as another program and another user: starts the durable cluster of a folder and
// leaves it running, or stops it. It prints what it knows as one JSON object.
const [action, folder = ""] = process.argv.slice(2);
const cluster = await startDurableCluster(folder);
if (action === "stop") await cluster.stop();
process.stdout.write(JSON.stringify({ port: cluster.port, ownerUrl: cluster.ownerUrl, appUrl: cluster.appUrl }));
