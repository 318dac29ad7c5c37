import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { act, cleanup, renderHook, waitFor } from "@testing-library/react";
import type { ReactNode } from "react";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import {
  dropDraft,
  exportUnsent,
  forgetAccount,
  InvalidEntryError,
  keepDraft,
  NotSavedError,
  previewSummary,
  rememberAccount,
  retireSyringe,
  saveEntry,
  saveSyringe,
  useBike,
  useBikes,
  useDraft,
  useDrafts,
  useSyncStatus,
  useSyringes,
  useUnsent,
  type NewEntry,
} from "./index.ts";
import { phoneOf } from "./logbook/phone.ts";

const bikeId = "0193a000-0000-7000-8000-000000000001";
const at = "2026-03-01T09:00:00.000Z";
const newBike: NewEntry = { bikeId, kind: "bike", at, hours: null, body: { name: "Blue" } };
const reading: NewEntry = { bikeId, kind: "hours", at, hours: 12, body: {} };

let riders = 0;
const someone = () => ({ id: `rider-${(riders += 1)}`, name: "Ada", email: "ada@club.example" });

function inApp<T>(hook: () => T) {
  const client = new QueryClient();
  const wrapper = ({ children }: { children: ReactNode }) => (
    <QueryClientProvider client={client}>{children}</QueryClientProvider>
  );
  return renderHook(hook, { wrapper }).result;
}

describe("the screens' view of the logbook", () => {
  beforeEach(() => rememberAccount(someone()));
  afterEach(() => {
    cleanup();
    forgetAccount();
  });

  it("shows a saved entry at once, wherever the bike is shown", async () => {
    const bikes = inApp(useBikes);
    const bike = inApp(() => useBike(bikeId));
    const unsent = inApp(useUnsent);
    await waitFor(() => expect(bikes.current.data).toEqual([]));
    await waitFor(() => expect(bike.current.data).toBeNull());
    await act(async () => {
      await saveEntry(newBike);
      await saveEntry(reading);
    });
    await waitFor(() =>
      expect(bikes.current.data).toMatchObject([
        { bikeId, details: { name: "Blue" }, summary: { hours: { now: 12 } }, unsent: 2 },
      ]),
    );
    await waitFor(() =>
      expect(bike.current.data?.log.map(({ entry }) => entry.kind)).toEqual(["hours", "bike"]),
    );
    await waitFor(() => expect(unsent.current.data).toHaveLength(2));
  });

  it("counts what waits to be sent", async () => {
    const status = inApp(useSyncStatus);
    await waitFor(() => expect(status.current).toMatchObject({ phase: "idle", unsent: 0 }));
    const kept = await act(() => saveEntry(newBike));
    await waitFor(() =>
      expect(status.current).toEqual({
        phase: "idle",
        unsent: 1,
        refused: 0,
        oldestUnsentAt: kept.savedAt,
        lastSyncAt: null,
      }),
    );
  });

  it("shows the next person nothing, and the first one everything again", async () => {
    const first = someone();
    rememberAccount(first);
    const bikes = inApp(useBikes);
    await act(() => saveEntry(newBike));
    await waitFor(() => expect(bikes.current.data).toHaveLength(1));
    act(() => rememberAccount(someone()));
    await waitFor(() => expect(bikes.current.data).toEqual([]));
    act(forgetAccount);
    expect(bikes.current.data).toBeUndefined();
    act(() => rememberAccount(first));
    await waitFor(() => expect(bikes.current.data).toHaveLength(1));
  });

  it("judges anew what an older version stored in another shape", async () => {
    const account = someone();
    rememberAccount(account);
    await saveEntry(newBike);
    const database = await phoneOf(account).open();
    const [row] = await database.getAll("bikes");
    await database.put("bikes", { ...row!, format: 0, summary: {} as never });
    const bikes = inApp(useBikes);
    await waitFor(() => expect(bikes.current.data).toMatchObject([{ summary: { name: "Blue" } }]));
  });

  it("keeps a draft until it is dropped or saved", async () => {
    const draft = inApp(() => useDraft(bikeId, "check"));
    const drafts = inApp(useDrafts);
    await waitFor(() => expect(draft.current.data).toBeNull());
    await act(() => keepDraft(bikeId, "check", { hours: "12" }));
    await waitFor(() => expect(draft.current.data?.content).toEqual({ hours: "12" }));
    await waitFor(() => expect(drafts.current.data).toHaveLength(1));
    await act(() => dropDraft(bikeId, "check"));
    await waitFor(() => expect(draft.current.data).toBeNull());
    await act(() => keepDraft("new", "bike", {}));
    await act(() => saveEntry(newBike, { draft: { bikeId: "new", form: "bike" } }));
    await waitFor(() => expect(drafts.current.data).toEqual([]));
  });

  it("lists the syringes in use", async () => {
    const five = { id: "five", label: "5 mL", capacityMl: 5, graduationMl: 0.2 };
    const ten = { id: "ten", label: "10 mL", capacityMl: 10, graduationMl: 0.5 };
    const syringes = inApp(useSyringes);
    await act(async () => {
      await saveSyringe(five);
      await saveSyringe(ten);
      await saveSyringe({ ...five, label: "Small" });
    });
    await waitFor(() =>
      expect(syringes.current.data?.map(({ label }) => label).sort()).toEqual(["10 mL", "Small"]),
    );
    await act(() => retireSyringe(ten));
    await waitFor(() => expect(syringes.current.data).toEqual([{ ...five, label: "Small" }]));
  });
});

describe("saving without an account", () => {
  it("is not saved", async () => {
    forgetAccount();
    await expect(saveEntry(newBike)).rejects.toBeInstanceOf(NotSavedError);
  });
});

describe("saving", () => {
  beforeEach(() => rememberAccount(someone()));

  it("passes on what is wrong by field", async () => {
    const wrong = { ...reading, hours: -1 } as NewEntry;
    await saveEntry(newBike);
    await expect(saveEntry(wrong)).rejects.toBeInstanceOf(InvalidEntryError);
    await expect(previewSummary(bikeId, wrong)).rejects.toBeInstanceOf(InvalidEntryError);
  });

  it("can be undone by nothing but the phone's loss: the unsent entries go into a file", async () => {
    const { entry } = await saveEntry(newBike);
    const file = JSON.parse(await (await exportUnsent()).text()) as { entries: object[] };
    expect(file.entries).toMatchObject([{ entry: { id: entry.id, body: { name: "Blue" } } }]);
  });
});
