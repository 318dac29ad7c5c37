import type { ZxcvbnFactory } from "@zxcvbn-ts/core";

/** Found before this many guesses, a password is as good as on the list of 49,000 common ones. */
const ENOUGH_GUESSES = 50_000;
/** The estimate's work grows with the square of the length; nobody guesses further than this. */
const JUDGED_LENGTH = 40;
/** Words that anyone would try here, whoever the rider is. */
const CONTEXT_WORDS = ["sumpless"];

async function loadEstimator(): Promise<ZxcvbnFactory> {
  const [{ ZxcvbnFactory }, { dictionary, adjacencyGraphs }] = await Promise.all([
    import("@zxcvbn-ts/core"),
    import("@zxcvbn-ts/language-common"),
  ]);
  return new ZxcvbnFactory({ dictionary, graphs: adjacencyGraphs });
}

/** As it is, run together, and in its parts. */
const spellings = (text: string) => [text, text.replace(/\s/g, ""), ...text.split(/[\s@.]+/)];

/** Some megabytes of lists, loaded when the first password is chosen. */
let estimator: Promise<ZxcvbnFactory> | undefined;

/**
 * Whether a password is among the first that would be tried: a common one, with or without a
 * number behind it, a row of keys, a repeated word, the rider's own name or address (`about`).
 */
export async function isEasilyGuessed(password: string, about: string[]): Promise<boolean> {
  estimator ??= loadEstimator();
  const words = [...CONTEXT_WORDS, ...about.flatMap(spellings)];
  const { guesses } = (await estimator).check(password.slice(0, JUDGED_LENGTH), words);
  return guesses < ENOUGH_GUESSES;
}
