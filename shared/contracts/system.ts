import { z } from "zod";
import { noContent, nothing } from "./common.ts";
import { endpoint } from "./endpoint.ts";

export const health = endpoint({
  method: "GET",
  path: "/api/health",
  summary: "The process lives",
  params: nothing,
  query: nothing,
  body: nothing,
  result: z.strictObject({ ok: z.literal(true) }),
});
export const ready = endpoint({
  method: "GET",
  path: "/api/ready",
  summary: "Database, queue and files can be used",
  params: nothing,
  query: nothing,
  body: nothing,
  result: z.strictObject({ ok: z.literal(true) }),
});
export const openApi = endpoint({
  method: "GET",
  path: "/api/openapi.json",
  summary: "This interface, as OpenAPI 3.1",
  params: nothing,
  query: nothing,
  body: nothing,
  result: noContent,
  form: "file",
});
