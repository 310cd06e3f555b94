import { access, constants } from "node:fs/promises";
import { Readable } from "node:stream";
import { QueryTypes } from "sequelize";
import * as contract from "#shared/contracts/system.ts";
import { migrations } from "../db/migrations/list.ts";
import { AppError } from "../http/app-error.ts";
import type { Services } from "../http/context.ts";
import { FileAnswer } from "../http/file-answer.ts";
import { type Routes, read } from "../http/route.ts";
import { openApiOf } from "../presenters/open-api.ts";

export function registerSystemRoutes(routes: Routes): void {
  read(routes, contract.health, async () => ({ ok: true as const }), { reach: "anyone" });

  read(
    routes,
    contract.ready,
    async ({ services, log }) => {
      try {
        await checkDatabase(services);
        await access(services.storage.quarantineDir, constants.W_OK);
      } catch (error) {
        log.warn({ err: error }, "Not ready");
        throw new AppError("not_ready");
      }
      return { ok: true as const };
    },
    { reach: "anyone" },
  );

  let description: Buffer | undefined;
  read(
    routes,
    contract.openApi,
    async () => {
      // Made at the first question, when every route is registered.
      description ??= Buffer.from(JSON.stringify(openApiOf(routes.registered)));
      return new FileAnswer({
        stream: Readable.from([description]),
        byteSize: description.byteLength,
        mediaType: "application/json",
        fileName: "openapi.json",
        disposition: "inline",
      });
    },
    { reach: "anyone" },
  );
}

/** Every migration of this build is in, and the queue takes jobs. Throws otherwise. */
async function checkDatabase({ sequelize }: Services): Promise<void> {
  const done = await sequelize.query<{ name: string }>("select name from migrations", { type: QueryTypes.SELECT });
  const names = new Set(done.map(({ name }) => name));
  const missing = migrations.filter(({ name }) => !names.has(name));
  if (missing.length > 0) throw new Error(`Not migrated: ${missing.map(({ name }) => name).join(", ")}`);
  await sequelize.query("select 1 from graphile_worker.jobs limit 1", { type: QueryTypes.SELECT });
}
