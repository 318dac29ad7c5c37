import { create } from "qrcode";

/** Blank modules round the code, without which it is not found. */
const QUIET = 4;

/** Each row's dark stretches as bars one module high. */
function barsOf(size: number, isDark: (row: number, column: number) => boolean): string {
  let path = "";
  for (let row = 0; row < size; row++) {
    for (let column = 0; column < size; column++) {
      const from = column;
      while (column < size && isDark(row, column)) column++;
      if (column > from) path += `M${from} ${row}h${column - from}v1h${from - column}z`;
    }
  }
  return path;
}

/** A link to be scanned: dark on light in either theme, as scanners expect it. */
export default function QrCode({ text }: { text: string }) {
  const { modules } = create(text, { errorCorrectionLevel: "M" });
  const bars = barsOf(modules.size, (row, column) => modules.get(row, column) === 1);
  const side = modules.size + 2 * QUIET;
  return (
    <svg
      role="img"
      aria-label="The link as a code to scan"
      viewBox={`${-QUIET} ${-QUIET} ${side} ${side}`}
      shapeRendering="crispEdges"
      className="w-full max-w-72 self-center rounded-card bg-white"
    >
      <path d={bars} fill="black" />
    </svg>
  );
}
