import { Notice } from "@/components/ui/notice.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { ApiProblem } from "@/lib/api-client.ts";
import { messageOf } from "@/lib/form-problem.ts";
import { currentOf } from "../model/approval.ts";

type DecisionProblemProps = {
  readonly error: unknown;
  /** "It was not approved." */
  readonly what: string;
  readonly pathOfSheet: (revisionId: string) => string;
};

/** Why a decision did not land, and the way on: to the letter now out when another one took its place. */
export function DecisionProblem({ error, what, pathOfSheet }: DecisionProblemProps) {
  const problem = error instanceof ApiProblem ? error : null;
  const current = problem?.code === "wrong_state" ? currentOf(problem.problem?.extra) : null;
  const details = problem?.problem?.errors ?? [];
  return (
    <Notice tone="error" title={what}>
      <p>{messageOf(error)}</p>
      {details.length > 0 && (
        <ul className="list-disc pl-5">
          {details.map(({ pointer, detail }) => (
            <li key={pointer + detail}>{detail}</li>
          ))}
        </ul>
      )}
      {current && (
        <p className="mt-1">
          <TextLink to={pathOfSheet(current.revisionId)}>Go to revision {current.letter}, which is out now</TextLink>
        </p>
      )}
      {!current && problem?.code !== "validation_failed" && <p>Nothing was changed.</p>}
    </Notice>
  );
}
