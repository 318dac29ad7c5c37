import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { render, screen } from "@testing-library/react";
import { MemoryRouter, Route, Routes } from "react-router-dom";
import { beforeEach, expect, test, vi } from "vitest";
import { CHECK_FORM, keepDraft, rememberAccount, saveEntry } from "../../../offline/index.ts";
import { patterns } from "../../../ui/paths.ts";
import { beginCheck, changeRun } from "../draft/check-draft.ts";
import { stepPaths } from "../check-paths.ts";
import CheckPage from "../index.tsx";

const bikeId = "0193a000-0000-7000-8000-000000000001";
const at = "2026-03-01T09:00:00.000Z";
const syringe = { id: "five", label: "5 mL", capacityMl: 5, graduationMl: 0.2 };
const own = { seconds: 45, rhythm: "steady", nominalMl: null } as const;

const set = { at, hoursText: "12.0", estimatedHours: false, syringe, hoseMaybeOff: true };
const afterRun1 = changeRun(beginCheck(set), 1, { startedAt: at, endText: "1.0" });

beforeEach(() => {
  vi.spyOn(window, "scrollTo").mockImplementation(() => undefined);
  rememberAccount({ id: crypto.randomUUID(), name: "Wren", email: "wren@moor.example" });
});

async function openAfterRun1(sequence: typeof own | null) {
  const body = { name: "Moss", sequence };
  await saveEntry({ bikeId, kind: "bike", at, hours: null, body });
  await keepDraft(bikeId, CHECK_FORM, afterRun1);
  render(
    <QueryClientProvider client={new QueryClient()}>
      <MemoryRouter initialEntries={[stepPaths(bikeId).again(1)]}>
        <Routes>
          <Route path={patterns.check} element={<CheckPage />} />
        </Routes>
      </MemoryRouter>
    </QueryClientProvider>,
  );
}

// 1 mL from marks of 0.2 mL takes 3 runs, which a first check doubles.
test.each([own, null])(
  "says after the first run of an own or unknown sequence how many are needed, and why",
  async (sequence) => {
    await openAfterRun1(sequence);
    expect(await screen.findByRole("heading", { name: "1 of 6 runs read" })).toBeVisible();
    expect(screen.getByText(/it gets twice the runs of a usual check/)).toBeVisible();
    expect(screen.queryByText(/shows after the first one/)).not.toBeInTheDocument();
  },
);
