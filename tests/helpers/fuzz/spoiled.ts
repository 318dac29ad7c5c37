import fc from "fast-check";
import { hostileText } from "./arbitrary-of-schema.ts";

/** What no field should hold. */
const junk = fc.oneof(
  hostileText,
  fc.jsonValue({ maxDepth: 4 }),
  fc.double(),
  fc.constantFrom<unknown>(
    -0,
    2 ** 53,
    1e308,
    [],
    {},
    [[[[[[]]]]]],
    { __proto__: null, constructor: { prototype: { admin: true } } },
    "x".repeat(70_000),
  ),
);

/** Where in a value a step leads: chosen by a number, whatever the value holds. */
function spoil(value: unknown, path: number[], how: number, by: unknown): unknown {
  const [step, ...rest] = path;
  if (step === undefined || typeof value !== "object" || value === null) return by;
  if (Array.isArray(value)) {
    if (value.length === 0) return [by];
    const at = step % value.length;
    return value.map((item: unknown, n) => (n === at ? spoil(item, rest, how, by) : item));
  }
  const fields: [string, unknown][] = Object.entries(value);
  const [name, field] = fields[step % Math.max(1, fields.length)] ?? ["x", undefined];
  if (rest.length > 0) return { ...value, [name]: spoil(field, rest, how, by) };
  if (how === 0) return Object.fromEntries(fields.filter(([other]) => other !== name));
  if (how === 1) return { ...value, [`${name}X`]: by };
  return { ...value, [name]: by };
}

/** The same values with one field missing, strange, or too many; as deep inside as it goes. */
export const spoiled = (values: fc.Arbitrary<unknown>): fc.Arbitrary<unknown> =>
  fc
    .tuple(values, fc.array(fc.nat(20), { minLength: 1, maxLength: 6 }), fc.nat(3), junk)
    .map(([value, path, how, by]) => spoil(value, path, how, by));
