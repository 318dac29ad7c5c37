import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { render, screen, waitFor } from "@testing-library/react";
import { userEvent } from "@testing-library/user-event";
import { MemoryRouter } from "react-router-dom";
import { beforeEach, expect, test, vi } from "vitest";
import { rememberAccount, saveEntry, useBike } from "../../offline/index.ts";
import LogHoursSheet from "./log-hours-sheet.tsx";

const bikeId = "0193a000-0000-7000-8000-000000000001";
const daysAgo = (days: number) => new Date(Date.now() - days * 86_400_000).toISOString();
const saveHours = (hours: number, at: string) =>
  saveEntry({ bikeId, kind: "hours", at, hours, body: {} });

const closed = vi.fn();

function Sheet() {
  const record = useBike(bikeId).data?.record;
  return record ? <LogHoursSheet bike={record} onClose={closed} /> : null;
}

beforeEach(async () => {
  closed.mockClear();
  // jsdom has no modal dialogs.
  HTMLDialogElement.prototype.showModal = function () {
    this.open = true;
  };
  HTMLDialogElement.prototype.close = () => undefined;
  rememberAccount({ id: crypto.randomUUID(), name: "Wren", email: "wren@moor.example" });
  const body = { name: "Moss" };
  await saveEntry({ bikeId, kind: "bike", at: daysAgo(60), hours: null, body });
  await saveHours(2, daysAgo(40));
  await saveHours(12, daysAgo(19));
  render(
    <QueryClientProvider client={new QueryClient()}>
      <MemoryRouter>
        <Sheet />
      </MemoryRouter>
    </QueryClientProvider>,
  );
});

const type = async (text: string) =>
  userEvent.type(await screen.findByRole("textbox", { name: "Engine hours" }), text, {
    initialSelectionStart: 0,
    initialSelectionEnd: 10,
  });

test("asks about 320 typed for 32.0 before it is saved, and lets it be saved", async () => {
  await type("320");
  expect(await screen.findByText(/^308\sh more than on .*\. Is that right\?$/)).toBeVisible();
  await userEvent.click(screen.getByRole("button", { name: "Save hours" }));
  await waitFor(() => expect(closed).toHaveBeenCalledOnce());
});

test("asks nothing about an ordinary reading", async () => {
  await type("32.0");
  expect(screen.queryByText(/Is that right/)).not.toBeInTheDocument();
  await userEvent.click(screen.getByRole("button", { name: "Save hours" }));
  await waitFor(() => expect(closed).toHaveBeenCalledOnce());
});

test("asks once about hours that the clock does not allow", async () => {
  await type("3200");
  expect(await screen.findByText(/You can save it: it is kept/)).toBeVisible();
  expect(screen.queryByText(/Is that right/)).not.toBeInTheDocument();
});
