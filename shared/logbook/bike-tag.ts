/** No letter or digit that looks like another one, and no vowel: a tag never spells a word. */
const ALPHABET = "2346789CDFHJKMNPQRTVWXY";
const LENGTH = 6;
/** Of a UUID's end, so many hexadecimal digits are random, and fit a number exactly. */
const RANDOM_DIGITS = 12;

/**
 * A short name for a bike, to be read aloud and typed in the paddock: six letters and digits from
 * the random end of its id (the front of a UUIDv7 is the time). Two of a thousand bikes share one
 * about once in 300 clubs, so that a tag finds bikes and does not identify them.
 *
 * @example bikeTag("0190a000-0000-7000-8000-000000000001") // "222223"
 */
export function bikeTag(bikeId: string): string {
  let rest = Number.parseInt(bikeId.replaceAll("-", "").slice(-RANDOM_DIGITS), 16);
  let tag = "";
  for (let place = 0; place < LENGTH; place++) {
    tag = ALPHABET.charAt(rest % ALPHABET.length) + tag;
    rest = Math.floor(rest / ALPHABET.length);
  }
  return tag;
}

/** What was typed, as a tag is written: any case, with or without spaces and hyphens. */
export const readBikeTag = (typed: string) => typed.toUpperCase().replace(/[\s-]/g, "");
