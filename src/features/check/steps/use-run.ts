import { useParams } from "react-router-dom";
import { countedNumber, runAt } from "../draft/check-draft.ts";
import { useOpenCheck } from "../open-check.ts";

/** The run that the address names, with the check it belongs to; counted from 1. */
export function useRun() {
  const check = useOpenCheck();
  const n = Number(useParams().n);
  const exists = Number.isInteger(n) && n >= 1 && n <= check.draft.runs.length + 1;
  const number = countedNumber(check.draft, n);
  const of = check.plan.runs && number <= check.plan.runs ? ` of ${check.plan.runs}` : "";
  return { ...check, n, exists, run: runAt(check.draft, n), name: `Run ${number}${of}` };
}
