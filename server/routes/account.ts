import * as contract from "#shared/contracts/account.ts";
import { endSession } from "../commands/end-session.ts";
import { changePassword } from "../commands/set-password.ts";
import { AppError, notAllowed, notFound } from "../http/app-error.ts";
import type { ReadContext } from "../http/context.ts";
import { type Routes, read, write } from "../http/route.ts";
import type { LiveSession } from "../http/session.ts";
import { accountPolicy } from "../policies/account.ts";
import { presentMe } from "../presenters/me.ts";
import { presentSession } from "../presenters/session.ts";
import { liveSessionOf, liveSessionsOf, ownSession } from "../queries/live-sessions.ts";

export function registerAccountRoutes(routes: Routes): void {
  read(routes, contract.whoAmI, async (context) => presentMe(await ownSession(context)), { reach: "anyone" });

  write(routes, contract.changeAccount, async (context, { body }) => {
    const live = await signedIn(context);
    if (!accountPolicy.rename({ began: live.session.began, hasPassword: live.person.passwordHash !== null })) {
      throw notAllowed("Sign in with your password to change your name.");
    }
    await live.person.update({ name: body.name }, { transaction: context.transaction });
    return presentMe(live, context.transaction);
  });

  write(routes, contract.changePassword, async (context, { body }) => {
    const { person, session } = await signedIn(context);
    await changePassword(context, { personId: person.id, sessionId: session.id, ...body });
    return undefined;
  });

  read(routes, contract.listSessions, async (context) => {
    const own = await signedIn(context);
    const sessions = await liveSessionsOf(context, own);
    return { items: sessions.map((each) => presentSession(each, { currentId: own.session.id })) };
  });

  write(routes, contract.endSession, async (context, { params }) => {
    const session = await liveSessionOf(context, await signedIn(context), params.sessionId);
    if (!session) throw notFound("session");
    await endSession({ sessionId: session.id, now: context.now, transaction: context.transaction });
    return undefined;
  });
}

async function signedIn(context: ReadContext): Promise<LiveSession> {
  const live = await ownSession(context);
  if (!live) throw new AppError("not_signed_in");
  return live;
}
