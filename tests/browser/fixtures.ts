import AxeBuilder from "@axe-core/playwright";
import { test as base, expect, type Page } from "@playwright/test";
import { spawn, type ChildProcess } from "node:child_process";
import { once } from "node:events";
import { mkdtemp, rm } from "node:fs/promises";
import { createServer, type AddressInfo } from "node:net";
import { tmpdir } from "node:os";
import path from "node:path";

async function freePort(): Promise<number> {
  const probe = createServer().listen(0, "127.0.0.1");
  await once(probe, "listening");
  const { port } = probe.address() as AddressInfo;
  probe.close();
  await once(probe, "close");
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
      env: { ...environment, LOG_LEVEL: "error" },
      stdio: ["ignore", "ignore", "inherit"],
    });
    const isUp = () =>
      fetch(`${this.origin}/api/health`).then(
        (answer) => answer.ok,
        () => false,
      );
    await expect.poll(isUp, { timeout: 30_000 }).toBe(true);
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

/** A signed-in account of the API, for setting a scene and for asking what the server thinks. */
export class Rider {
  readonly email: string;
  readonly origin: string;
  private cookie = "";
  id = "";
  static readonly password = "correct horse battery";

  constructor(origin: string, email: string) {
    this.origin = origin;
    this.email = email;
  }

  async call(method: string, pathname: string, body?: unknown): Promise<Response> {
    const answer = await fetch(this.origin + pathname, {
      method,
      headers: {
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
    this.id = ((await answer.json()) as { user: { id: string } }).user.id;
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
}

let riders = 0;

interface Fixtures {
  server: ProductServer;
  rider: Rider;
}

/**
 * A test with a server of its own. Anything that the page logs as an error fails the test, but for
 * the network's own complaints while the server is stopped.
 */
export const test = base.extend<Fixtures>({
  server: async ({}, use) => {
    const dataDir = await mkdtemp(path.join(tmpdir(), "sumpless-"));
    const server = new ProductServer(await freePort(), dataDir);
    await server.start();
    await use(server);
    await server.stop();
    await rm(dataDir, { recursive: true, force: true });
  },
  baseURL: async ({ server }, use) => use(server.origin),
  rider: async ({ server }, use) => use(new Rider(server.origin, `rider${++riders}@moor.example`)),
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

/** Signs up through the product's own form. */
export async function signUp(page: Page, email: string, name = "Wren"): Promise<void> {
  await page.goto("/sign-up");
  await page.getByLabel(/name|call you/i).fill(name);
  await page.getByLabel(/e-mail/i).fill(email);
  await page.getByLabel(/^password/i).fill(Rider.password);
  await page.getByRole("button", { name: /create|sign up/i }).click();
  await expect(page).toHaveURL("/");
}

export async function signIn(page: Page, email: string): Promise<void> {
  await page.goto("/sign-in");
  await page.getByLabel("E-mail").fill(email);
  await page.getByLabel("Password", { exact: true }).fill(Rider.password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page).toHaveURL("/");
}

/** Waits until the service worker has everything that the app needs with no network. */
export const waitUntilInstalled = (page: Page) =>
  page.evaluate(async () => {
    await navigator.serviceWorker.ready;
    if (navigator.serviceWorker.controller) return;
    await new Promise((resolve) => {
      navigator.serviceWorker.addEventListener("controllerchange", resolve, { once: true });
    });
  });

/** Waits until a form half filled in has come to rest on the phone, with `text` in it. */
export const waitUntilDrafted = (page: Page, text: string) =>
  expect
    .poll(() =>
      page.evaluate(async () => {
        const { name } = (await indexedDB.databases()).find((one) =>
          one.name?.startsWith("sumpless-logbook-"),
        )!;
        const opened = <T>(request: IDBRequest<T>) =>
          new Promise<T>((resolve) => {
            request.onsuccess = () => resolve(request.result);
          });
        const database = await opened(indexedDB.open(name!));
        const drafts = database.transaction("drafts").objectStore("drafts").getAll();
        const text = JSON.stringify(await opened(drafts));
        database.close();
        return text;
      }),
    )
    .toContain(text);

/** No violation of axe's rules on the page as it stands. */
export async function expectAccessible(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map((n) => n.html).join(" ")}`)).toEqual(
    [],
  );
}

export { expect };
