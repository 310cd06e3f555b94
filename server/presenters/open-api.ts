import { z } from "zod";
import type { Endpoint } from "#shared/contracts/endpoint.ts";
import { errorCodes } from "#shared/contracts/error-codes.ts";
import { problemSchema } from "#shared/contracts/errors.ts";
import type { Registered } from "../http/route.ts";
import { sessionCookieNames } from "../http/session.ts";

type Json = Record<string, unknown>;

/** The interface as OpenAPI 3.1 (spec.openapis.org/oas/v3.1.0), from the very objects that parse and check it. */
export function openApiOf(registered: readonly Registered[]): Json {
  const paths: Record<string, Json> = {};
  for (const { endpoint, reach } of registered) {
    const path = endpoint.path.replace(/:([A-Za-z]+)/g, "{$1}");
    paths[path] = { ...paths[path], [endpoint.method.toLowerCase()]: operationOf(endpoint, reach !== "anyone") };
  }
  return {
    openapi: "3.1.0",
    info: { title: "Standproud", version: "1" },
    paths,
    components: {
      schemas: { Problem: schemaOf(problemSchema, "output") },
      securitySchemes: Object.fromEntries(
        sessionCookieNames.map((name) => [schemeOf(name), { type: "apiKey", in: "cookie", name }]),
      ),
    },
  };
}

function operationOf(endpoint: Endpoint, needsSession: boolean): Json {
  // What mail programs post from elsewhere stands outside /api and carries no header of ours.
  const guarded = endpoint.method !== "GET" && endpoint.path.startsWith("/api/");
  return {
    summary: endpoint.summary,
    parameters: [
      ...parametersOf(endpoint.params, "path"),
      ...parametersOf(endpoint.query, "query"),
      ...(guarded ? [{ name: "X-Standproud", in: "header", required: true, schema: { const: "1" } }] : []),
    ],
    ...bodyOf(endpoint),
    responses: {
      [endpoint.status ?? 200]: { description: "Done", ...contentOf(endpoint) },
      default: {
        description: `A problem document (RFC 9457) with one of the codes: ${Object.keys(errorCodes).join(", ")}`,
        content: { "application/problem+json": { schema: { $ref: "#/components/schemas/Problem" } } },
      },
    },
    security: needsSession ? sessionCookieNames.map((name) => ({ [schemeOf(name)]: [] })) : [],
  };
}

const schemeOf = (cookie: string): string => (cookie.startsWith("__Secure-") ? "secureSession" : "session");

function schemaOf(schema: z.ZodType, io: "input" | "output"): Json {
  const { $schema: _, ...json } = z.toJSONSchema(schema, { io, unrepresentable: "any", target: "draft-2020-12" });
  return json;
}

function parametersOf(schema: z.ZodType, place: "path" | "query"): Json[] {
  const { properties = {}, required = [] } = schemaOf(schema, "input") as {
    properties?: Record<string, Json>;
    required?: string[];
  };
  return Object.entries(properties).map(([name, property]) => ({
    name,
    in: place,
    required: place === "path" || required.includes(name),
    schema: property,
  }));
}

function bodyOf(endpoint: Endpoint): Json {
  if (endpoint.form === "multipart") {
    const file = { type: "object", properties: { file: { type: "string", format: "binary" } }, required: ["file"] };
    return { requestBody: { required: true, content: { "multipart/form-data": { schema: file } } } };
  }
  const schema = schemaOf(endpoint.body, "input");
  if (endpoint.method === "GET" || Object.keys((schema.properties ?? {}) as Json).length === 0) return {};
  return { requestBody: { required: true, content: { "application/json": { schema } } } };
}

function contentOf(endpoint: Endpoint): Json {
  if (endpoint.form === "stream") return { content: { "text/event-stream": {} } };
  if (endpoint.form === "file") return { content: { "application/octet-stream": {} } };
  if (endpoint.status === 204 || endpoint.status === 202) {
    const schema = schemaOf(endpoint.result, "output");
    if (Object.keys(schema).length === 0 || "not" in schema) return {};
  }
  return { content: { "application/json": { schema: schemaOf(endpoint.result, "output") } } };
}
