import type { z } from "zod";

type Issue = z.core.$ZodIssue;

/** In a union, the branch that came closest says what is wrong. */
function closestBranch(branches: Issue[][]): Issue[] {
  return branches.reduce((best, branch) => (branch.length < best.length ? branch : best));
}

function flatten(issues: Issue[], path: PropertyKey[] = []): [string, string][] {
  return issues.flatMap((issue): [string, string][] => {
    const here = [...path, ...issue.path];
    if (issue.code === "invalid_union" && issue.errors.length > 0)
      return flatten(closestBranch(issue.errors), here);
    if (issue.code === "unrecognized_keys")
      return issue.keys.map((key) => [[...here, key].join("."), "This field is not known here."]);
    return [[here.join("."), issue.message]];
  });
}

/** The first sentence about each wrong field, by its dotted path (`body.runs.0.endMl`). */
export function errorsByField(error: z.ZodError): Record<string, string> {
  return Object.fromEntries(flatten(error.issues).reverse());
}
