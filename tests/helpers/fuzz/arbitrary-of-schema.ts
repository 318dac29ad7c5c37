import fc from "fast-check";
import { z } from "zod";

/** What of JSON Schema zod's translation of our schemas is made of. */
interface JsonSchema {
  type?: string | string[];
  const?: fc.JsonValue;
  enum?: fc.JsonValue[];
  anyOf?: JsonSchema[];
  oneOf?: JsonSchema[];
  allOf?: JsonSchema[];
  format?: string;
  pattern?: string;
  minLength?: number;
  maxLength?: number;
  minimum?: number;
  maximum?: number;
  exclusiveMinimum?: number;
  items?: JsonSchema;
  minItems?: number;
  maxItems?: number;
  properties?: Record<string, JsonSchema>;
  required?: string[];
  propertyNames?: JsonSchema;
  additionalProperties?: JsonSchema | boolean;
}

/** Longer lists than this find nothing that shorter ones do not. */
const MAX_ITEMS = 6;

/** Texts that have broken something somewhere. */
export const hostileText = fc.oneof(
  fc.string({ unit: "binary" }),
  fc.string({ unit: "grapheme" }),
  fc.constantFrom(
    "' OR '1'='1",
    "<script>alert(1)</script>",
    "../../../etc/passwd",
    "%00%0d%0aSet-Cookie: a=b",
    "\u0000\uffff\ud800",
    "𝒳".repeat(500),
    "${7*7}{{7*7}}",
    "__proto__",
    "constructor",
    "=1+1",
    "NaN",
    "",
    " ",
  ),
);

const uuids = fc.oneof(
  fc.uuid({ version: 7 }),
  fc.uuid(),
  fc.constant("00000000-0000-0000-0000-000000000000"),
);

const instants = fc
  .date({
    min: new Date("0000-01-01T00:00:00Z"),
    max: new Date("9999-12-31T23:59:59Z"),
    noInvalidDate: true,
  })
  .map((date) => date.toISOString());

function ofText({ format, pattern, allOf, minLength = 0, maxLength = 3_000 }: JsonSchema) {
  const patterns = [pattern, ...(allOf ?? []).map((part) => part.pattern)].join();
  if (format === "uuid" || patterns.includes("8[89abAB]") || patterns.includes("-[1-8]"))
    return uuids;
  if (format === "date-time") return instants;
  if (format === "email") return fc.stringMatching(/^[a-z]{1,8}@[a-z]{1,8}\.example$/);
  return hostileText.map((text) => (text || "x").padEnd(minLength, "x").slice(0, maxLength));
}

function ofNumber({ type, minimum, maximum = 1e9, exclusiveMinimum }: JsonSchema) {
  const min = minimum ?? exclusiveMinimum ?? -1e9;
  if (type === "integer")
    return fc.integer({ min: Math.ceil(min), max: Math.min(maximum, 2 ** 31) });
  return fc.oneof(
    fc.double({ min, max: maximum, noNaN: true, minExcluded: exclusiveMinimum !== undefined }),
    fc.constantFrom(min, maximum),
  );
}

function ofObject({ properties = {}, required = [], ...rest }: JsonSchema): fc.Arbitrary<unknown> {
  if (rest.propertyNames && typeof rest.additionalProperties === "object")
    return fc.dictionary(
      ofJsonSchema(rest.propertyNames) as fc.Arbitrary<string>,
      ofJsonSchema(rest.additionalProperties),
      { maxKeys: MAX_ITEMS },
    );
  const fields = Object.entries(properties).map(([name, schema]) => [name, ofJsonSchema(schema)]);
  return fc.record(Object.fromEntries(fields) as Record<string, fc.Arbitrary<unknown>>, {
    requiredKeys: required,
  });
}

function ofJsonSchema(schema: JsonSchema): fc.Arbitrary<unknown> {
  const { type, enum: allowed, anyOf, oneOf, items = {}, minItems, maxItems } = schema;
  if (schema.const !== undefined) return fc.constant(schema.const);
  if (allowed) return fc.constantFrom(...allowed);
  const branches = anyOf ?? oneOf;
  if (branches) return fc.oneof(...branches.map(ofJsonSchema));
  if (Array.isArray(type))
    return fc.oneof(...type.map((one) => ofJsonSchema({ ...schema, type: one })));
  if (type === "string") return ofText(schema);
  if (type === "number" || type === "integer") return ofNumber(schema);
  if (type === "boolean") return fc.boolean();
  if (type === "null") return fc.constant(null);
  if (type === "object") return ofObject(schema);
  if (type === "array")
    return fc.array(ofJsonSchema(items), {
      minLength: minItems ?? 0,
      maxLength: Math.min(maxItems ?? MAX_ITEMS, MAX_ITEMS),
    });
  return fc.jsonValue();
}

/**
 * Values that a zod schema takes, or nearly: what it says of a value's shape is kept to, and what it
 * says beyond that, about fields together, is left to chance.
 */
export const arbitraryOf = (schema: z.ZodType): fc.Arbitrary<unknown> =>
  ofJsonSchema(z.toJSONSchema(schema, { io: "input", unrepresentable: "any" }) as JsonSchema);
