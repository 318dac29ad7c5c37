/** `Ann`, `Ann and Bob`, `Ann, Bob and Cleo` */
export function inWords(names: readonly string[]): string {
  const [last = "", ...others] = names.toReversed();
  return others.length === 0 ? last : `${others.toReversed().join(", ")} and ${last}`;
}
