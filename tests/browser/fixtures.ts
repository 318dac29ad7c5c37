import AxeBuilder from "@axe-core/playwright";
import { test as base, expect, type BrowserContext, type Page } from "@playwright/test";
import { spawn, type ChildProcess } from "node:child_process";
import { randomInt } from "node:crypto";
import { once } from "node:events";
import { mkdtemp, rm } from "node:fs/promises";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import path from "node:path";

/** Below those that the system gives to callers: nobody takes it while the server is stopped. */
async function freePort(): Promise<number> {
  const port = randomInt(20_000, 32_000);
  const probe = createServer();
  try {
    await once(probe.listen(port), "listening");
  } catch {
    return freePort();
  }
  await once(probe.close(), "close");
  return port;
}

/** The built product as `npm start` serves it, on its own port and data, to be stopped at will. */
export class ProductServer {
  private process: ChildProcess | null = null;
  readonly origin: string;
  /** The folder that holds the built product; a deployed one may be elsewhere. */
  root = ".";
  private readonly port: number;
  private readonly dataDir: string;

  constructor(port: number, dataDir: string) {
    this.port = port;
    this.dataDir = dataDir;
    this.origin = `http://localhost:${port}`;
  }

  async start(): Promise<void> {
    const environment = { ...process.env, PORT: String(this.port), DATA_DIR: this.dataDir };
    this.process = spawn(process.execPath, [path.join(this.root, "dist/server/index.js")], {
      // As behind a proxy, which says where a caller is: no test eats up another's rate limits.
      env: { ...environment, LOG_LEVEL: "error", TRUST_PROXY: "1" },
      stdio: ["ignore", "ignore", "inherit"],
    });
    const isUp = () =>
      fetch(`${this.origin}/api/health`, { headers: { connection: "close" } }).then(
        (answer) => answer.ok,
        () => false,
      );
    await expect.poll(isUp, { intervals: [50], timeout: 60_000 }).toBe(true);
  }

  async stop(): Promise<void> {
    const running = this.process;
    this.process = null;
    if (!running || running.exitCode !== null) return;
    const exited = once(running, "exit");
    running.kill("SIGTERM");
    await exited;
  }
}

/** What every test may know of the server it talks to. */
export type Served = Pick<ProductServer, "origin">;

/** Serves the product, from an empty data folder, for as long as it is used. */
async function serve(use: (server: ProductServer) => Promise<void>): Promise<void> {
  const dataDir = await mkdtemp(path.join(tmpdir(), "sumpless-"));
  const server = new ProductServer(await freePort(), dataDir);
  await server.start();
  await use(server);
  await server.stop();
  await rm(dataDir, { recursive: true, force: true });
}

let addresses = 0;

/** An e-mail address that no other account of this worker's servers has. */
export const newEmail = (name = "rider") => `${name}${++addresses}@moor.example`;

let callers = 0;

/** Where a caller of its own calls from, as the proxy in front would say. */
const newCaller = () => ({
  "x-forwarded-for": `10.0.${Math.floor(++callers / 256)}.${callers % 256}`,
});

/** A signed-in account of the API, for setting a scene and for asking what the server thinks. */
export class Rider {
  readonly email: string;
  readonly origin: string;
  private readonly caller = newCaller();
  private cookie = "";
  private user = { id: "", name: "", email: "" };
  static readonly password = "correct horse battery";

  constructor(origin: string, email = newEmail()) {
    this.origin = origin;
    this.email = email;
  }

  get id(): string {
    return this.user.id;
  }

  async call(method: string, pathname: string, body?: unknown): Promise<Response> {
    const answer = await fetch(this.origin + pathname, {
      method,
      headers: {
        ...this.caller,
        // The server ends a connection that was quiet for 5 s, perhaps just as it is used again.
        connection: "close",
        origin: this.origin,
        cookie: this.cookie,
        ...(body === undefined ? {} : { "content-type": "application/json" }),
      },
      body: body === undefined ? undefined : JSON.stringify(body),
    });
    this.cookie = answer.headers.get("set-cookie")?.split(";")[0] ?? this.cookie;
    return answer;
  }

  private async enter(way: "sign-up" | "sign-in", body: object): Promise<this> {
    const answer = await this.call("POST", `/api/auth/${way}`, body);
    expect(answer.ok, `${way}: ${answer.status}`).toBe(true);
    this.user = ((await answer.json()) as { user: Rider["user"] }).user;
    return this;
  }

  signUp(name = "Wren") {
    return this.enter("sign-up", { email: this.email, password: Rider.password, name });
  }

  signIn() {
    return this.enter("sign-in", { email: this.email, password: Rider.password });
  }

  async push(entries: object[]): Promise<void> {
    const answer = await this.call("POST", "/api/sync", { known: {}, entries });
    const { results } = (await answer.json()) as { results: { status: string }[] };
    expect(results.filter(({ status }) => status !== "stored")).toEqual([]);
  }

  async bikes<T = Record<string, unknown>>(): Promise<T[]> {
    const answer = await this.call("GET", "/api/bikes");
    return ((await answer.json()) as { bikes: T[] }).bikes;
  }

  /** Signs a phone in that has opened nothing yet, as the form would: with a session of its own. */
  async enterOn(phone: BrowserContext): Promise<void> {
    const { cookie } = await new Rider(this.origin, this.email).signIn();
    const [name, value] = cookie.split("=");
    const account = { name: "sumpless-account", value: JSON.stringify(this.user) };
    const origins = [{ origin: this.origin, localStorage: [account] }];
    await phone.setStorageState({ cookies: [], origins });
    await phone.addCookies([{ name: name!, value: value!, url: this.origin }]);
  }
}

interface Fixtures {
  server: Served;
  rider: Rider;
}

/**
 * A test on the server that this worker keeps, with a rider whom it does not know yet. Anything that
 * the page logs as an error fails the test, but for the network's own complaints while the server is
 * stopped.
 */
export const test = base.extend<Fixtures, { keptServer: ProductServer }>({
  keptServer: [async ({}, use) => serve(use), { scope: "worker" }],
  server: async ({ keptServer }, use) => use(keptServer),
  baseURL: async ({ server }, use) => use(server.origin),
  extraHTTPHeaders: async ({}, use) => use(newCaller()),
  rider: async ({ server }, use) => use(new Rider(server.origin)),
  page: async ({ page }, use) => {
    const errors: string[] = [];
    page.on("pageerror", (error) => errors.push(error.message));
    page.on("console", (message) => {
      if (message.type() === "error" && !/Failed to load resource/.test(message.text()))
        errors.push(message.text());
    });
    await use(page);
    expect(errors, "errors in the page").toEqual([]);
  },
});

/** A test with a server of its own: one that stops it, or that reads all its mail. */
export const testAlone = test.extend<{ server: ProductServer }>({
  server: async ({}, use) => serve(use),
});

/** Signs up through the product's own form. */
export async function signUp(page: Page, email: string, name = "Wren"): Promise<void> {
  await page.goto("/sign-up");
  await page.getByLabel(/name|call you/i).fill(name);
  await page.getByLabel(/e-mail/i).fill(email);
  await page.getByLabel(/^password/i).fill(Rider.password);
  await page.getByRole("button", { name: /create|sign up/i }).click();
  await expect(page).toHaveURL("/");
}

/** Signs in through the product's own form. */
export async function signIn(page: Page, email: string): Promise<void> {
  await page.goto("/sign-in");
  await page.getByLabel("E-mail").fill(email);
  await page.getByLabel("Password", { exact: true }).fill(Rider.password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page).toHaveURL("/");
}

/** Opens the app on a phone that has opened nothing yet, signed in as one who has an account. */
export async function openAs(rider: Rider, page: Page, pathname = "/"): Promise<void> {
  await rider.enterOn(page.context());
  await page.goto(pathname);
}

/** A link of the bar at the top; the page below may have one of the same name, once it is there. */
export const inTopBar = (page: Page, name: "Account" | "Clubs") =>
  page.getByRole("banner").getByRole("link", { name });

/** Waits until the service worker has everything that the app needs with no network. */
export const waitUntilInstalled = (page: Page) =>
  page.evaluate(async () => {
    await navigator.serviceWorker.ready;
    if (navigator.serviceWorker.controller) return;
    await new Promise((resolve) => {
      navigator.serviceWorker.addEventListener("controllerchange", resolve, { once: true });
    });
  });

/** What stands in a store of the logbook on the phone, of whoever is signed in. */
export const rowsOnPhone = <T = Record<string, unknown>>(
  page: Page,
  store: "bikes" | "drafts" | "entries",
): Promise<T[]> =>
  page.evaluate(async (store) => {
    const { id } = JSON.parse(localStorage.getItem("sumpless-account")!) as { id: string };
    const databases = await indexedDB.databases();
    const info = databases.find(({ name }) => name === `sumpless-logbook-${id}`);
    if (!info) return [];
    const outcome = <R>(request: IDBRequest<R>) =>
      new Promise<R>((resolve) => {
        request.onsuccess = () => resolve(request.result);
      });
    const database = await outcome(indexedDB.open(info.name!));
    const rows = await outcome(database.transaction(store).objectStore(store).getAll());
    database.close();
    return rows as T[];
  }, store);

/** Waits until a form half filled in has come to rest on the phone, with `text` in it. */
export const waitUntilDrafted = (page: Page, text: string) =>
  expect.poll(async () => JSON.stringify(await rowsOnPhone(page, "drafts"))).toContain(text);

/**
 * Waits until the server has all that the phone holds; to be called once what was saved is seen.
 * The words at the top may stand there from before, so the phone's own store is asked first.
 */
export async function waitUntilSent(page: Page): Promise<void> {
  const entries = () => rowsOnPhone<{ unsentSince?: string }>(page, "entries");
  const unsent = async () => (await entries()).filter(({ unsentSince }) => unsentSince).length;
  await expect.poll(unsent).toBe(0);
  await expect(page.getByRole("status").filter({ hasText: /^All sent/ })).toBeVisible();
}

/** The page reaches no further than the screen's right edge, once it has come to rest. */
export const expectNoSidewaysScroll = (page: Page, where?: string) =>
  expect
    .poll(
      () =>
        page.evaluate(
          () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
        ),
      where,
    )
    .toBeLessThanOrEqual(0);

/** Sets the size of letters, as a phone's own setting would. */
export const setLetters = (page: Page, fontSize: string) =>
  page.evaluate((fontSize) => {
    document.documentElement.style.fontSize = fontSize;
  }, fontSize);

/** No violation of axe's rules on the page as it stands. */
export async function expectAccessible(page: Page): Promise<void> {
  // Without frames in the page, legacy mode finds the same, and opens no second page to do so.
  const axe = new AxeBuilder({ page }).setLegacyMode().options({ resultTypes: ["violations"] });
  const { violations } = await axe.analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map((n) => n.html).join(" ")}`)).toEqual(
    [],
  );
}

export { expect };
