/** P(recorded class | true class): a row for each true class, a member for each class that can be recorded. */
export type Confusion = Readonly<Record<string, Readonly<Record<string, number>>>>;

/** What was recorded at one visit: one class, a set of classes, or null for not looked at. */
export type Observation = string | readonly string[] | null;

/** The true class of a state with its row is missing, or a row does not sum to 1. */
export class ConfusionError extends Error {
  constructor(
    readonly row: string,
    problem: string,
  ) {
    super(`row ${row}: ${problem}`);
    this.name = 'ConfusionError';
  }
}

const SUM_TOLERANCE = 1e-9;

/**
 * Checks a confusion matrix.
 *
 * @param classes the true classes that need a row.
 * @throws ConfusionError naming the row that is missing, negative or does not sum to 1.
 */
export function checkConfusion(confusion: Confusion, classes: readonly string[]): void {
  for (const name of classes) {
    if (!Object.hasOwn(confusion, name)) throw new ConfusionError(name, 'is missing');
  }
  for (const [name, row] of Object.entries(confusion)) {
    const entries = Object.values(row);
    if (entries.some((p) => !(p >= 0 && p <= 1))) throw new ConfusionError(name, 'has a member outside 0 to 1');
    const sum = entries.reduce((total, p) => total + p, 0);
    if (Math.abs(sum - 1) > SUM_TOLERANCE) throw new ConfusionError(name, `sums to ${sum}, not to 1`);
  }
}

/** Every class that some true class can be recorded as. */
export function recordedClasses(confusion: Confusion): Set<string> {
  return new Set(Object.values(confusion).flatMap((row) => Object.keys(row)));
}

/**
 * P(observation | state) for every state. A set of classes has the sum of its members.
 *
 * @param classOf the true class of each state.
 * @returns null when nothing was looked at.
 */
export function likelihoodOf(
  observation: Observation,
  confusion: Confusion,
  classOf: readonly string[],
): Float64Array | null {
  if (observation === null) return null;
  const classes = new Set(typeof observation === 'string' ? [observation] : observation);
  const byClass = new Map(
    Object.entries(confusion).map(([name, row]) => [
      name,
      [...classes].reduce((sum, seen) => sum + (row[seen] ?? 0), 0),
    ]),
  );
  return Float64Array.from(classOf, (name) => byClass.get(name) ?? 0);
}
