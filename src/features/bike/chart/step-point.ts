/** Which of `count` points a key steps to from the one at `index`; null where it is no stepping key. */
export function stepPoint(key: string, index: number, count: number): number | null {
  const last = count - 1;
  switch (key) {
    case "ArrowRight":
    case "ArrowUp":
      return Math.min(index + 1, last);
    case "ArrowLeft":
    case "ArrowDown":
      return Math.max(index - 1, 0);
    case "Home":
      return 0;
    case "End":
      return last;
    default:
      return null;
  }
}
