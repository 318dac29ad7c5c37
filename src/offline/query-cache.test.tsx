import { useQuery } from "@tanstack/react-query";
import {
  PersistQueryClientProvider,
  type PersistedClient,
} from "@tanstack/react-query-persist-client";
import { cleanup, render, screen, waitFor } from "@testing-library/react";
import { afterEach, describe, expect, it, vi } from "vitest";
import { rememberAccount } from "./account.ts";
import { eraseFromPhone } from "./erase-from-phone.ts";
import { ApiError, NoNetworkError } from "./errors.ts";
import { createReadCache } from "./query-cache.ts";

interface Question {
  name: string;
  persist: boolean;
  /** What the server would say; never, with no network. */
  answer?: string;
}

function Answer({ name, persist, answer }: Question) {
  const { data } = useQuery({
    queryKey: [name],
    queryFn: () => answer ?? new Promise<string>(() => undefined),
    networkMode: "always",
    meta: { persist },
  });
  return <p>{`${name}: ${data ?? "nothing"}`}</p>;
}

/** What the server said before, now that it answers by this error. */
function FailingClubs({ error: thrown }: { error: Error }) {
  const { data, error } = useQuery({
    queryKey: ["clubs"],
    queryFn: () => Promise.reject<string>(thrown),
    retry: false,
    networkMode: "always",
    meta: { persist: true },
  });
  return <p>{error ? `failed: ${data ?? "nothing"}` : "asking"}</p>;
}

/** Opens the app as `accountId`, asking the questions. */
function open(accountId: string, ...questions: Question[]) {
  rememberAccount({ id: accountId, name: "Ada", email: "ada@club.example" });
  const cache = createReadCache(accountId);
  return render(
    <PersistQueryClientProvider {...cache}>
      {questions.map((question) => (
        <Answer key={question.name} {...question} />
      ))}
    </PersistQueryClientProvider>,
  );
}

/** Opens it again, where the server has this to say. */
function openFailing(accountId: string, error: Error) {
  render(
    <PersistQueryClientProvider {...createReadCache(accountId)}>
      <FailingClubs error={error} />
    </PersistQueryClientProvider>,
  );
}

async function openAndClose(accountId: string, ...questions: Question[]): Promise<void> {
  open(accountId, ...questions);
  const key = `sumpless-read-${accountId}`;
  await waitFor(() => expect(localStorage.getItem(key)).toContain("queries"), { timeout: 3_000 });
  cleanup();
}

/** The cache writes a second behind. */
const pastTheThrottle = () => new Promise((resolve) => setTimeout(resolve, 1_500));

const clubs = { name: "clubs", persist: true };
const logbook = { name: "logbook", persist: false };

describe("the read cache", () => {
  afterEach(cleanup);

  it("keeps the queries that ask for it, and no others", async () => {
    await openAndClose("a", { ...logbook, answer: "bikes" }, { ...clubs, answer: "two" });
    open("a", clubs, logbook);
    await screen.findByText("clubs: two");
    screen.getByText("logbook: nothing");
  });

  it("shows nothing of one account to another", async () => {
    await openAndClose("b", { ...clubs, answer: "three" });
    open("c", clubs);
    await screen.findByText("clubs: nothing");
  });

  it("keeps an answer that could not be had anew", async () => {
    await openAndClose("e", { ...clubs, answer: "five" });
    openFailing("e", new NoNetworkError());
    await screen.findByText("failed: five");
    const key = "sumpless-read-e";
    localStorage.removeItem(key);
    await waitFor(() => expect(localStorage.getItem(key)).toContain("five"), { timeout: 3_000 });
    cleanup();
    open("e", clubs);
    await screen.findByText("clubs: five");
  });

  it.each([403, 404])("forgets what the server answers by %i", async (status) => {
    const accountId = `g${status}`;
    await openAndClose(accountId, { ...clubs, answer: "seven" });
    const problem = { type: "about:blank", title: "", status, detail: "It is not here." };
    openFailing(accountId, new ApiError(problem));
    await screen.findByText("failed: nothing");
    const kept = () => localStorage.getItem(`sumpless-read-${accountId}`);
    await waitFor(() => expect(kept()).not.toContain("seven"), { timeout: 3_000 });
    cleanup();
    open(accountId, clubs);
    await screen.findByText("clubs: nothing");
  });

  it("forgets each answer two weeks after it was given, however lately another came", async () => {
    const members = { name: "members", persist: true };
    await openAndClose("h", { ...clubs, answer: "eight" }, { ...members, answer: "nine" });
    const key = "sumpless-read-h";
    const cache = JSON.parse(localStorage.getItem(key)!) as PersistedClient;
    const [old] = cache.clientState.queries.filter(({ queryKey }) => queryKey[0] === "clubs");
    old!.state.dataUpdatedAt -= 15 * 86_400_000;
    localStorage.setItem(key, JSON.stringify(cache));
    open("h", clubs, members, { ...logbook, answer: "bikes" });
    await screen.findByText("members: nine");
    screen.getByText("clubs: nothing");
    await waitFor(() => expect(localStorage.getItem(key)).not.toContain("eight"), {
      timeout: 3_000,
    });
  });

  it("writes nothing more of an account that was taken off the phone", async () => {
    open("f", { ...clubs, answer: "six" });
    await screen.findByText("clubs: six");
    await eraseFromPhone();
    await pastTheThrottle();
    expect(Object.keys(localStorage).filter((key) => key.includes("-f"))).toEqual([]);
  });

  it("may be damaged, with no loss but its own", async () => {
    const reports = [vi.mocked(console.error), vi.mocked(console.warn)];
    for (const report of reports) report.mockImplementation(() => undefined);
    localStorage.setItem("sumpless-read-d", "{");
    open("d", { ...clubs, answer: "four" });
    await screen.findByText("clubs: four");
    for (const report of reports) report.mockClear();
  });
});
