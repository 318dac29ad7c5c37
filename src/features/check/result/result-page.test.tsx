import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { render, screen } from "@testing-library/react";
import { userEvent } from "@testing-library/user-event";
import { MemoryRouter, Route, Routes } from "react-router-dom";
import { beforeEach, expect, test, vi } from "vitest";
import { rememberAccount, saveEntry } from "../../../offline/index.ts";
import { checkResultPath, patterns } from "../../../ui/paths.ts";
import CheckPage from "../index.tsx";

const bikeId = "0193a000-0000-7000-8000-000000000001";
const syringe = { id: "five", label: "5 mL", capacityMl: 5, graduationMl: 0.2 };

const saveCheck = (day: number, hours: number, endMl: number, closedOut: boolean) =>
  saveEntry({
    bikeId,
    kind: "check",
    at: `2026-03-0${day}T09:00:00.000Z`,
    hours,
    body: { syringe, runs: [{ startMl: 0, endMl }], closedOut },
  });

function openResult(entryId: string) {
  render(
    <QueryClientProvider client={new QueryClient()}>
      <MemoryRouter initialEntries={[checkResultPath(bikeId, entryId)]}>
        <Routes>
          <Route path={patterns.check} element={<CheckPage />} />
          <Route path="*" element={<p>Another page</p>} />
        </Routes>
      </MemoryRouter>
    </QueryClientProvider>,
  );
}

beforeEach(async () => {
  vi.spyOn(window, "scrollTo").mockImplementation(() => undefined);
  rememberAccount({ id: crypto.randomUUID(), name: "Wren", email: "wren@moor.example" });
  const at = "2026-03-01T09:00:00.000Z";
  await saveEntry({ bikeId, kind: "bike", at, hours: null, body: { name: "Moss" } });
  await saveCheck(2, 12, 3, true);
});

test("leads to the close-out first, and writes no work down before it", async () => {
  const { entry } = await saveCheck(4, 32, 2.3, false);
  openResult(entry.id);
  await userEvent.click(await screen.findByRole("checkbox", { name: /line bled/ }));
  expect(await screen.findByRole("checkbox", { name: /line bled/ })).toBeChecked();
  expect(screen.getByText(/^Close the check out first\./)).toBeVisible();
  expect(screen.queryByRole("button", { name: "Write it in the log" })).not.toBeInTheDocument();

  await userEvent.click(screen.getByRole("link", { name: "Close it out" }));
  for (const tick of await screen.findAllByRole("checkbox")) await userEvent.click(tick);
  await userEvent.click(screen.getByRole("button", { name: "Save the close-out" }));
  await screen.findByText("Another page");

  openResult(entry.id);
  expect(await screen.findByRole("checkbox", { name: /line bled/ })).toBeChecked();
  await userEvent.click(await screen.findByRole("button", { name: "Write it in the log" }));
  expect(await screen.findByText("Written in the log: saved on this phone.")).toBeVisible();
});

test("lets work be written down at once after a check that was closed out", async () => {
  const { entry } = await saveCheck(4, 32, 2.3, true);
  openResult(entry.id);
  await userEvent.click(await screen.findByRole("checkbox", { name: /line bled/ }));
  expect(await screen.findByRole("button", { name: "Write it in the log" })).toBeVisible();
  expect(screen.queryByText(/^Close the check out/)).not.toBeInTheDocument();
});
