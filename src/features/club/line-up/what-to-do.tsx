import { actionInks, actionWords } from "../../../ui/words.ts";
import type { BoardRow } from "./board.ts";

/** What is to be done with a bike, the worst first: never *ride on* against what somebody wrote. */
export function WhatToDo({ row }: { row: BoardRow }) {
  const { words, ink } = toDo(row);
  return <p className={`leading-tight font-bold ${ink}`}>{words}</p>;
}

function toDo({ hoseMaybeOff, stopAdvised, action, verdict }: BoardRow) {
  if (hoseMaybeOff) return { words: "Hose may be off: do not start", ink: actionInks.stop };
  const advised = stopAdvised ? "stop" : action;
  if (advised === null || verdict === "none") return { words: "First check", ink: "text-ink" };
  return { words: actionWords[advised], ink: actionInks[advised] };
}
