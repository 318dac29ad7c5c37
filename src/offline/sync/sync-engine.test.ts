// @vitest-environment node
import { describe, expect, it, vi } from "vitest";
import { ApiError, NoNetworkError } from "../errors.ts";
import { createSyncEngine } from "./sync-engine.ts";

const problem = (status: number) => ({ type: "about:blank", title: "", status, detail: "" });

/** An engine whose sessions the test ends, and whose timers the test lets ring. */
function rig() {
  const phases: string[] = [];
  const sessions: { succeed(): void; fail(error: unknown): void }[] = [];
  let timer: { ring(): void; delayMs: number } | null = null;
  const engine = createSyncEngine({
    runSession: () =>
      new Promise<void>((succeed, fail) => {
        sessions.push({ succeed, fail });
      }),
    report: (phase) => phases.push(phase),
    schedule(ring, delayMs) {
      timer = { ring, delayMs };
      return () => (timer = null);
    },
    random: () => 1,
  });
  return { engine, phases, sessions, timer: () => timer };
}

const settle = () => new Promise((resolve) => setImmediate(resolve));

describe("the sync engine", () => {
  it("never runs two sessions at once, and runs once more for what came in between", async () => {
    const { engine, sessions, phases } = rig();
    const first = engine.sync();
    void engine.sync();
    void engine.sync();
    expect(sessions).toHaveLength(1);
    sessions[0]!.succeed();
    await settle();
    expect(sessions).toHaveLength(2);
    sessions[1]!.succeed();
    await first;
    expect(sessions).toHaveLength(2);
    expect(phases).toEqual(["sending", "idle", "sending", "idle"]);
  });

  it("tries again by itself, later each time, until it succeeds", async () => {
    const { engine, sessions, timer, phases } = rig();
    void engine.sync();
    sessions[0]!.fail(new NoNetworkError());
    await settle();
    expect(timer()!.delayMs).toBe(2_000);
    timer()!.ring();
    sessions[1]!.fail(new ApiError(problem(503)));
    await settle();
    expect(timer()!.delayMs).toBe(4_000);
    timer()!.ring();
    sessions[2]!.succeed();
    await settle();
    expect(phases.at(-1)).toBe("idle");
    void engine.sync();
    sessions[3]!.fail(new NoNetworkError());
    await settle();
    expect(timer()!.delayMs).toBe(2_000);
  });

  it("leaves a server alone for as long as it asked", async () => {
    const { engine, sessions, timer } = rig();
    void engine.sync();
    sessions[0]!.fail(new ApiError(problem(429), 60_000));
    await settle();
    expect(timer()!.delayMs).toBe(60_000);
    await engine.sync();
    expect(sessions).toHaveLength(1);
    timer()!.ring();
    expect(sessions).toHaveLength(2);
  });

  it("tries at once when there is a reason to, in place of the try set for later", async () => {
    const { engine, sessions, timer } = rig();
    void engine.sync();
    sessions[0]!.fail(new NoNetworkError());
    await settle();
    engine.syncInTime();
    expect(sessions).toHaveLength(1);
    void engine.sync();
    expect(sessions).toHaveLength(2);
    expect(timer()).toBeNull();
  });

  it.each([401, 409])("asks to sign in on %i and does not try again by itself", async (status) => {
    const { engine, sessions, timer, phases } = rig();
    void engine.sync();
    sessions[0]!.fail(new ApiError(problem(status)));
    await settle();
    expect(phases.at(-1)).toBe("signed-out");
    expect(timer()).toBeNull();
    void engine.sync();
    expect(sessions).toHaveLength(2);
  });

  it("never takes a missing network for a sign-out", async () => {
    const { engine, sessions, phases } = rig();
    void engine.sync();
    sessions[0]!.fail(new NoNetworkError({ status: 401, retryAfterMs: null }));
    await settle();
    expect(phases.at(-1)).toBe("offline");
  });

  it("reports an error of our own making, and still tries again", async () => {
    const { engine, sessions, timer } = rig();
    const reported = vi.mocked(console.error).mockImplementation(() => undefined);
    void engine.sync();
    sessions[0]!.fail(new TypeError("ours"));
    await settle();
    expect(timer()).not.toBeNull();
    expect(reported).toHaveBeenCalledOnce();
    reported.mockClear();
  });

  it("does nothing more once stopped", async () => {
    const { engine, sessions, timer, phases } = rig();
    void engine.sync();
    engine.stop();
    sessions[0]!.fail(new NoNetworkError());
    await settle();
    await engine.sync();
    expect(sessions).toHaveLength(1);
    expect(timer()).toBeNull();
    expect(phases).toEqual(["sending"]);
  });
});
