import type { ExpressAuthConfig } from "@auth/express";
import { ExpressAuth } from "@auth/express";
import Credentials from "@auth/express/providers/credentials";
import type { RequestHandler } from "express";
import { z } from "zod";
import { email, token as linkToken } from "#shared/contracts/common.ts";
import { endSession } from "../commands/end-session.ts";
import { signInWithLink } from "../commands/sign-in-with-link.ts";
import { signInWithPassword } from "../commands/sign-in-with-password.ts";
import { notFound } from "../http/app-error.ts";
import type { Services } from "../http/context.ts";
import { liveSession, readSession, sessionCookie, usesSecureCookies } from "../http/session.ts";

declare module "@auth/core/types" {
  interface User {
    sessionId?: string;
  }
}
declare module "@auth/core/jwt" {
  interface JWT {
    personId?: string;
    sessionId?: string;
  }
}

const passwordFields = z.object({ email, password: z.string().min(1).max(200) });
const linkFields = z.object({ token: linkToken });
const longestSessionS = 30 * 24 * 3600;

/**
 * What of Auth.js is reached from outside, letter for letter. It reads an address more leniently than the router does
 * (empty parts are skipped), so that anything else would be a way round the limits on these.
 */
const reachable = new Set(["/csrf", "/session", "/signout", "/callback/password", "/callback/link"]);

/** Sign-in and sign-out under /auth, with the public address in place of whatever host the request names. */
export function authentication(services: Services): RequestHandler {
  const home = new URL(services.env.PUBLIC_URL);
  const handle = ExpressAuth(configOf(services));
  return (request, response, next) => {
    if (!reachable.has(request.path)) return next(notFound("page"));
    request.headers.host = home.host;
    Object.defineProperty(request, "protocol", { value: home.protocol.slice(0, -1) });
    response.setHeader("Cache-Control", "no-store");
    return handle(request, response, next);
  };
}

function configOf(services: Services): ExpressAuthConfig {
  const { env, log } = services;
  const secure = usesSecureCookies(env);
  return {
    basePath: "/auth",
    trustHost: true,
    secret: env.AUTH_SECRET,
    useSecureCookies: secure,
    cookies: {
      sessionToken: {
        name: sessionCookie(env),
        options: { httpOnly: true, sameSite: "lax", path: "/", secure },
      },
    },
    session: { strategy: "jwt", maxAge: longestSessionS },
    pages: { signIn: "/sign-in", signOut: "/sign-in", error: "/sign-in" },
    providers: [
      Credentials({
        id: "password",
        credentials: { email: {}, password: {} },
        authorize: async (given, request) => {
          const fields = passwordFields.safeParse(given);
          if (!fields.success) return null;
          return signInWithPassword(services, { ...fields.data, ...(await circumstances(request, services)) });
        },
      }),
      Credentials({
        id: "link",
        credentials: { token: {} },
        authorize: async (given, request) => {
          const fields = linkFields.safeParse(given);
          if (!fields.success) return null;
          return signInWithLink(services, { ...fields.data, ...(await circumstances(request, services)) });
        },
      }),
    ],
    callbacks: {
      /** The token names a person and a session and nothing else: rights are read from the rows for each request. */
      async jwt({ token, user }) {
        if (user) return { personId: user.id, sessionId: user.sessionId };
        const live = token.sessionId ? await liveSession(token.sessionId, new Date()) : null;
        return live ? { personId: live.person.id, sessionId: live.session.id } : null;
      },
      session: ({ session, token }) => ({ expires: session.expires, user: { id: token.personId } }),
    },
    events: {
      async signOut(message) {
        if (!("token" in message) || !message.token?.sessionId) return;
        await endSession({ sessionId: message.token.sessionId, now: new Date() });
      },
    },
    logger: {
      // A wrong password or a spent link is an answer, not a fault.
      error: (error) =>
        error.name === "CredentialsSignin" || error.name === "MissingCSRF"
          ? log.info({ reason: error.name }, "A sign-in was refused")
          : log.error({ err: error }, "Sign-in failed"),
      warn: (code) => log.warn({ code }, "Sign-in warns"),
      debug: () => undefined,
    },
  };
}

/** The browser, and the session that its cookie held until now: a new one takes its place. */
async function circumstances(request: Request, { env }: Services): Promise<{ agent: string; replaces: string | null }> {
  const before = await readSession(
    { headers: { cookie: request.headers.get("cookie") ?? undefined } },
    env,
    new Date(),
  );
  return {
    agent: (request.headers.get("user-agent") ?? "").slice(0, 400),
    replaces: before?.session.id ?? null,
  };
}
