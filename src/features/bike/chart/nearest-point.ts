/** The index of the point nearest to `hours`; of several at the same hours, the last. */
export function nearestPoint(points: readonly { atHours: number }[], hours: number): number {
  const distance = (index: number) => Math.abs((points[index]?.atHours ?? Infinity) - hours);
  return points.reduce(
    (nearest, _, index) => (distance(index) <= distance(nearest) ? index : nearest),
    0,
  );
}
