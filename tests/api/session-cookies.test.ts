import { addDays } from "date-fns";
import { afterEach, describe, expect, it, vi } from "vitest";
import { cookieOf, createPhone, PASSWORD } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

const https = { publicOrigin: "https://logbook.example" };
const ann = { email: "ann@club.example", password: PASSWORD, name: "Ann" };

const cookiesOf = (response: { headers: Record<string, unknown> }) =>
  response.headers["set-cookie"] as string[] | undefined;

afterEach(() => {
  vi.useRealTimers();
});

describe("the session cookie", () => {
  it("over http is plain, and out of reach of scripts and other sites", async () => {
    const phone = createPhone(await startTestServer());
    const response = await phone.post("/api/auth/sign-up").send(ann);
    expect(cookiesOf(response)).toEqual([
      expect.stringMatching(/^session=\w{40}; HttpOnly; Max-Age=7776000; Path=\/; SameSite=Lax$/),
    ]);
  });

  it("over https is bound to the host and never sent in the open", async () => {
    const server = await startTestServer(https);
    const response = await createPhone(server).post("/api/auth/sign-up").send(ann);
    const [cookie] = cookiesOf(response)!;
    expect(cookie).toMatch(
      /^__Host-session=\w{40}; HttpOnly; Max-Age=7776000; Path=\/; SameSite=Lax; Secure$/,
    );
    const me = createPhone(server).get("/api/auth/me").set("Cookie", cookieOf(response));
    await me.expect(200);
  });

  it("is sent again, its end moved, once half its time has passed", async () => {
    const phone = createPhone(await startTestServer());
    await phone.post("/api/auth/sign-up").send(ann).expect(201);
    expect(cookiesOf(await phone.get("/api/auth/me"))).toBeUndefined();
    vi.useFakeTimers({ toFake: ["Date"], now: addDays(new Date(), 60) });
    const renewed = await phone.get("/api/auth/me");
    expect(cookiesOf(renewed)).toEqual([expect.stringContaining("Max-Age=7776000")]);
    vi.setSystemTime(addDays(new Date(), 60));
    await phone.get("/api/auth/me").expect(200);
    vi.setSystemTime(addDays(new Date(), 91));
    await phone.get("/api/auth/me").expect(401);
  });

  it("that nobody was given signs nobody in", async () => {
    const phone = createPhone(await startTestServer());
    for (const cookie of ["session=made-up", "session=", "session=%E0%A4%A"])
      await phone.get("/api/auth/me").set("Cookie", cookie).expect(401);
  });
});
