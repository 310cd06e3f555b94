import { useQuery } from "@tanstack/react-query";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { formatInstant } from "@/lib/format.ts";
import { useEndSession } from "../api/mutations.ts";
import { sessionsQuery } from "../api/queries.ts";
import { deviceName } from "./device-name.ts";

/** Where one is signed in. Ending a session takes effect with its very next request. */
export function SessionList() {
  const sessions = useQuery(sessionsQuery);
  const end = useEndSession();
  if (sessions.isPending) return <Skeleton label="Loading where you are signed in" rows={2} />;
  if (sessions.isError) {
    return (
      <ProblemNotice
        what="The list could not be loaded."
        error={sessions.error}
        onRetry={() => void sessions.refetch()}
      />
    );
  }
  return (
    <>
      {end.isError && (
        <Notice tone="error" className="mb-3">
          {messageOf(end.error)}
        </Notice>
      )}
      <ul className="border-t border-rule">
        {sessions.data.items.map((session) => (
          <li
            key={session.id}
            className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2 border-b border-rule py-3"
          >
            <span className="min-w-0 flex-1 basis-72">
              <span className="block font-semibold">{deviceName(session.agent)}</span>
              <span className="block text-sm text-graphite">
                Signed in by {session.began === "link" ? "a mailed link" : "password"}{" "}
                {formatInstant(session.createdAt)}, last seen {formatInstant(session.lastSeenAt)}
              </span>
              {session.agent !== "" && (
                <details className="text-fine text-graphite">
                  <summary className="inline-flex min-h-8 cursor-pointer items-center underline underline-offset-4 pointer-coarse:min-h-11">
                    Not sure which one that is?
                  </summary>
                  <span className="block break-words">It calls itself: {session.agent}</span>
                </details>
              )}
            </span>
            {session.current ? (
              <span className="text-sm font-semibold text-verdigris">This one, here</span>
            ) : (
              <Button
                size="small"
                kind="danger"
                aria-label={`End ${deviceName(session.agent).toLowerCase()}, last seen ${formatInstant(session.lastSeenAt)}`}
                busy={end.isPending && end.variables === session.id}
                onClick={() => end.mutate(session.id)}
              >
                End
              </Button>
            )}
          </li>
        ))}
      </ul>
    </>
  );
}
