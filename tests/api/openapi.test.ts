import { afterAll, beforeAll, describe, expect, it } from "vitest";
import * as account from "#shared/contracts/account.ts";
import * as anotherLike from "#shared/contracts/another-like.ts";
import * as artworks from "#shared/contracts/artworks.ts";
import * as clients from "#shared/contracts/clients.ts";
import type { Endpoint } from "#shared/contracts/endpoint.ts";
import * as jobSignals from "#shared/contracts/job-signals.ts";
import * as jobs from "#shared/contracts/jobs.ts";
import * as limits from "#shared/contracts/limits.ts";
import * as mailChoices from "#shared/contracts/mail-choices.ts";
import * as mockups from "#shared/contracts/mockups.ts";
import * as namedDrafts from "#shared/contracts/named-drafts.ts";
import * as notes from "#shared/contracts/notes.ts";
import * as outgoingMail from "#shared/contracts/outgoing-mail.ts";
import * as portfolio from "#shared/contracts/portfolio.ts";
import * as prices from "#shared/contracts/prices.ts";
import * as revisionDocuments from "#shared/contracts/revision-documents.ts";
import * as revisions from "#shared/contracts/revisions.ts";
import * as saws from "#shared/contracts/saws.ts";
import * as setAsides from "#shared/contracts/set-asides.ts";
import * as shop from "#shared/contracts/shop.ts";
import * as stock from "#shared/contracts/stock.ts";
import * as system from "#shared/contracts/system.ts";
import * as wallPhotos from "#shared/contracts/wall-photos.ts";
import { startTestApp, type TestApp } from "../support/app.ts";

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.stop());

type Operation = {
  parameters: { name: string; in: string }[];
  requestBody?: unknown;
  security: unknown[];
  responses: object;
};
type Description = { openapi: string; paths: Record<string, Record<string, Operation>> };

const modules = [
  account,
  anotherLike,
  artworks,
  clients,
  jobSignals,
  jobs,
  limits,
  mailChoices,
  mockups,
  namedDrafts,
  notes,
  outgoingMail,
  portfolio,
  prices,
  revisionDocuments,
  revisions,
  saws,
  setAsides,
  shop,
  stock,
  system,
  wallPhotos,
];
const isEndpoint = (value: unknown): value is Endpoint =>
  typeof value === "object" && value !== null && "method" in value && "path" in value && "result" in value;
const contracts: Endpoint[] = modules.flatMap((module) => (Object.values(module) as unknown[]).filter(isEndpoint));
const nameOf = ({ method, path }: Endpoint): string => `${method} ${path}`;

describe("the description of the interface", () => {
  it("has every contract, and every contract has a route", async () => {
    expect(app.registered.map(({ endpoint }) => nameOf(endpoint)).sort()).toEqual(contracts.map(nameOf).sort());
    const { text, headers } = await app.visitor().send("GET", "/api/openapi.json");
    expect(headers.get("content-type")).toBe("application/json");
    const { openapi, paths } = JSON.parse(text) as Description;
    expect(openapi).toBe("3.1.0");
    const described = Object.entries(paths).flatMap(([path, operations]) =>
      Object.keys(operations).map((method) => `${method.toUpperCase()} ${path.replace(/\{(\w+)\}/g, ":$1")}`),
    );
    expect(described.sort()).toEqual(contracts.map(nameOf).sort());
  });

  it("says what each takes and that unknown fields are refused", async () => {
    const { paths } = JSON.parse((await app.visitor().send("GET", "/api/openapi.json")).text) as Description;
    const operation = paths["/api/shops/{shop}/clients"]?.post;
    expect(operation?.parameters.map(({ name, in: place }) => [name, place])).toEqual([
      ["shop", "path"],
      ["X-Standproud", "header"],
    ]);
    expect(operation?.requestBody).toMatchObject({
      content: {
        "application/json": {
          schema: {
            type: "object",
            required: ["name"],
            additionalProperties: false,
            properties: { name: { type: "string" } },
          },
        },
      },
    });
    expect(operation?.security).toHaveLength(2);
    expect(paths["/api/register"]?.post?.security).toEqual([]);
    expect(Object.keys(operation?.responses ?? {})).toEqual(["201", "default"]);
  });
});

describe("the process", () => {
  it("says that it lives and that it is ready", async () => {
    for (const path of ["/api/health", "/api/ready"]) {
      const { status, text } = await app.visitor().send("GET", path);
      expect({ status, text }).toEqual({ status: 200, text: '{"ok":true}' });
    }
  });
});
