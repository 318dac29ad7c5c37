import { useQuery } from "@tanstack/react-query";
import { PersistQueryClientProvider } from "@tanstack/react-query-persist-client";
import { cleanup, render, screen, waitFor } from "@testing-library/react";
import { afterEach, describe, expect, it, vi } from "vitest";
import { rememberAccount } from "./account.ts";
import { eraseFromPhone } from "./erase-from-phone.ts";
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

/** What the server said before, now that it says nothing. */
function FailingClubs() {
  const { data, error } = useQuery({
    queryKey: ["clubs"],
    queryFn: () => Promise.reject(new Error("No network just now.")),
    retry: false,
    networkMode: "always",
    meta: { persist: true },
  });
  return <p>{error ? `failed: ${String(data)}` : "asking"}</p>;
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
    const cache = createReadCache("e");
    render(
      <PersistQueryClientProvider {...cache}>
        <FailingClubs />
      </PersistQueryClientProvider>,
    );
    await screen.findByText("failed: five");
    const key = "sumpless-read-e";
    localStorage.removeItem(key);
    await waitFor(() => expect(localStorage.getItem(key)).toContain("five"), { timeout: 3_000 });
    cleanup();
    open("e", clubs);
    await screen.findByText("clubs: five");
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
