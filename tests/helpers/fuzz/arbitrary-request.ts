import fc from "fast-check";
import { arbitraryOf, hostileText } from "./arbitrary-of-schema.ts";
import { routeBodies } from "./route-bodies.ts";
import { spoiled } from "./spoiled.ts";

/** What stands for an id in a path: one that is there, or anything else. */
export type PathPart = { own: true } | { own: false; text: string };

/** The built client's files, as if they were a route. */
export const CLIENT_FILES = "GET /:file";

export interface FuzzRequest {
  /** As `listRoutes` names it, or `CLIENT_FILES`. */
  route: string;
  parts: PathPart[];
  query: string;
  /** "own", "none", or what stands in the place of a session. */
  cookie: string;
  origin: string;
  headers: Record<string, string>;
  body: Buffer | null;
}

/** Bytes as they stand in an address; some of them are no text in any encoding. */
const inAddress = (bytes: Buffer) => bytes.toString("hex").replace(/../g, "%$&");
const addressText = fc
  .tuple(hostileText, fc.constantFrom<BufferEncoding>("utf8", "utf8", "latin1"))
  .map(([text, encoding]) => inAddress(Buffer.from(text.slice(0, 500), encoding)));

const pathPart: fc.Arbitrary<PathPart> = fc.oneof(
  { weight: 3, arbitrary: fc.constant({ own: true as const }) },
  {
    weight: 1,
    arbitrary: fc.oneof(addressText, fc.uuid()).map((text) => ({ own: false as const, text })),
  },
);

const mostly = <T>(usual: T, ...others: fc.Arbitrary<T>[]) =>
  fc.oneof(
    { weight: 8, arbitrary: fc.constant(usual) },
    ...others.map((arbitrary) => ({ weight: 1, arbitrary })),
  );

/** Bytes that a header may hold at all: the rest never leaves the client. */
const headerText = fc.stringMatching(/^[\t -~]{0,80}$/);

const conditions = fc.constantFrom(
  "bytes=0-1",
  "bytes=99999-",
  "bytes=1-0,5-",
  '"x"',
  "*",
  "Tue, 01 Jan 2099 00:00:00 GMT",
);

const headers = fc.oneof(
  { weight: 6, arbitrary: fc.constant({}) },
  {
    weight: 1,
    arbitrary: fc.dictionary(
      fc.constantFrom(
        "accept",
        "accept-encoding",
        "authorization",
        "content-encoding",
        "if-none-match",
        "if-match",
        "if-modified-since",
        "if-range",
        "if-unmodified-since",
        "range",
        "user-agent",
        "x-forwarded-proto",
        "x-http-method-override",
        "host",
      ),
      fc.oneof(headerText, conditions),
      { maxKeys: 3 },
    ),
  },
);

const contentType = mostly(
  "application/json",
  fc.constantFrom(
    "text/plain",
    "application/x-www-form-urlencoded",
    "application/json; charset=utf-16",
    "application/json; charset=nonsense",
    "multipart/form-data; boundary=x",
    "",
  ),
  headerText,
);

const jsonBytes = (value: unknown) => Buffer.from(JSON.stringify(value) ?? "");

function bodyOf(route: string): fc.Arbitrary<Buffer | null> {
  const schema = routeBodies[route];
  const raw = fc.uint8Array({ maxLength: 2_000 }).map((bytes) => Buffer.from(bytes));
  const any = fc.jsonValue().map(jsonBytes);
  if (!schema) return fc.oneof({ weight: 6, arbitrary: fc.constant(null) }, raw, any);
  const valid = arbitraryOf(schema);
  const cut = fc.tuple(valid, fc.nat(200)).map(([value, by]) => {
    const bytes = jsonBytes(value);
    return bytes.subarray(0, Math.max(0, bytes.length - by));
  });
  return fc.oneof(
    { weight: 5, arbitrary: valid.map(jsonBytes) },
    { weight: 5, arbitrary: spoiled(valid).map(jsonBytes) },
    cut,
    raw,
    any,
    fc.constant(null),
  );
}

const requestTo = (route: string): fc.Arbitrary<FuzzRequest> =>
  fc
    .record({
      parts: fc.array(pathPart, { minLength: 4, maxLength: 4 }),
      query: mostly(
        "",
        addressText.map((text) => `?${text}`),
        fc.constantFrom(
          "?after=1&limit=5",
          "?limit=-1",
          "?after=%5B%5D&limit=1e9",
          "?a[b]=c&a=d&a=e",
          "?token=x",
        ),
      ),
      cookie: mostly("own", fc.constant("none"), headerText),
      origin: mostly("own", fc.constant("none"), headerText),
      headers,
      contentType,
      body: bodyOf(route),
    })
    .map(({ contentType: type, headers: more, ...request }) => ({
      route,
      ...request,
      headers: { ...(request.body && { "content-type": type }), ...more },
    }));

/** Requests to these routes, each as often as the others; most of them nearly what they should be. */
export const arbitraryRequest = (routes: string[]): fc.Arbitrary<FuzzRequest> =>
  fc.oneof(...routes.map(requestTo));
