const two = (number: number) => String(number).padStart(2, "0");

/** An instant as `<input type="datetime-local">` shows it in the rider's zone, to the minute. */
export function toLocalDateTime(instant: string): string {
  const at = new Date(instant);
  const year = String(at.getFullYear()).padStart(4, "0");
  const day = `${year}-${two(at.getMonth() + 1)}-${two(at.getDate())}`;
  return `${day}T${two(at.getHours())}:${two(at.getMinutes())}`;
}

/**
 * The instant that a local date and time names, or null where it is incomplete. A time that the
 * clocks skip in spring becomes the hour after; of a repeated hour in autumn it is the first.
 */
export function fromLocalDateTime(local: string): string | null {
  const at = new Date(local);
  return local === "" || Number.isNaN(at.getTime()) ? null : at.toISOString();
}
