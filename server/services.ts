import { resolve } from "node:path";
import type { Logger } from "pino";
import { connect } from "./db/connection.ts";
import { appDatabaseUrl, type Environment } from "./env.ts";
import { openDiskStorage } from "./files/disk-storage.ts";
import type { Services } from "./http/context.ts";
import { openWatchers } from "./live/watchers.ts";
import { createLog } from "./log.ts";
import { openLocalSink } from "./mail/local-sink.ts";
import { initModels } from "./models/init-models.ts";

/**
 * Opens what the application needs: database, files, and a local mail sink while no mail server is configured.
 * Throws when one of them can't be used. `close` ends all of it.
 */
export async function openServices(
  env: Environment,
  { log = createLog(env), poolMax }: { log?: Logger; poolMax?: number } = {},
): Promise<{ services: Services; close: () => Promise<void> }> {
  if (!env.APP_DATABASE_URL) {
    log.warn(
      "APP_DATABASE_URL is missing: the application runs with the role that owns the tables, so the database can't refuse it what must never change",
    );
  }
  const sequelize = connect(appDatabaseUrl(env), poolMax === undefined ? {} : { poolMax });
  await sequelize.authenticate();
  initModels(sequelize);
  const storage = await openDiskStorage(env.FILES_DIR);
  const mailSink = env.SMTP_URL ? null : await openLocalSink({ dir: mailSinkDir(env), log });
  const watchers = openWatchers(appDatabaseUrl(env), log);
  return {
    services: { env, sequelize, storage, mailSink, watchers, log },
    close: async () => {
      await watchers.close();
      await mailSink?.close();
      await sequelize.close();
    },
  };
}

/** Beside the files, never in a folder that is served: the mails hold links that sign people in. */
function mailSinkDir({ MAIL_SINK_DIR, FILES_DIR }: Environment): string {
  return MAIL_SINK_DIR ? resolve(MAIL_SINK_DIR) : resolve(FILES_DIR, "..", ".data", "mail");
}
