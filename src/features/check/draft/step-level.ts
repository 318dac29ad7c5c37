/**
 * The next level up or down that a rider can tell between marks: a whole number of `stepMl`, so that
 * a typed 2.93 steps to 3.0 and not to 3.03.
 *
 * @example stepLevel(2.9, 0.1, 1) // 3
 */
export function stepLevel(levelMl: number, stepMl: number, direction: 1 | -1): number {
  const steps = levelMl / stepMl;
  // The hair keeps 0.3/0.1 from counting as a little less than three steps.
  const next = direction > 0 ? Math.floor(steps + 1e-6) + 1 : Math.ceil(steps - 1e-6) - 1;
  return Math.max(0, Number((next * stepMl).toFixed(6)));
}
