/** How long a search may go on. */
export type Effort = {
  /** Steps of work, about two million a second on a small machine. The same number gives the same answer everywhere. */
  readonly work?: number;
  /** Asked now and then; once it says yes the best so far is given back. What it goes by is the caller's affair. */
  readonly shouldStop?: () => boolean;
};

/** Counts steps of work, so that a search ends after the same step each time it is run. */
export type WorkMeter = {
  /** Counts steps; false when none are left, and from then on. */
  readonly spend: (steps: number) => boolean;
  readonly left: () => number;
  /** Whether somebody asked for the end. */
  readonly isAskedToStop: () => boolean;
  /** A meter that ends after `steps` of its own, or with this one. */
  readonly within: (steps: number) => WorkMeter;
};

/** Steps that a search takes at most when nothing else is said: a few seconds. */
export const usualWork = 8_000_000;
/** Steps between two questions whether to stop. */
const stepsBetweenQuestions = 2_000;

/** A meter for one search. Work that is no number, or negative, is none at all. */
export function startMeter({ work = usualWork, shouldStop = () => false }: Effort = {}): WorkMeter {
  let left = work > 0 ? work : 0;
  let untilQuestion = stepsBetweenQuestions;
  let asked = false;
  const spend = (steps: number): boolean => {
    left -= steps;
    untilQuestion -= steps;
    if (untilQuestion <= 0 && !asked) {
      asked = shouldStop();
      untilQuestion = stepsBetweenQuestions;
    }
    return left > 0 && !asked;
  };
  return meterOf(
    spend,
    () => (asked ? 0 : Math.max(0, left)),
    () => asked,
  );
}

function meterOf(spend: WorkMeter["spend"], left: () => number, isAskedToStop: () => boolean): WorkMeter {
  return {
    spend,
    left,
    isAskedToStop,
    within: (steps) => {
      let own = steps;
      return meterOf(
        (spent) => {
          own -= spent;
          return spend(spent) && own > 0;
        },
        () => Math.max(0, Math.min(own, left())),
        isAskedToStop,
      );
    },
  };
}
