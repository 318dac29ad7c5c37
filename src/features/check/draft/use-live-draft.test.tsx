import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { act, renderHook, waitFor } from "@testing-library/react";
import type { ReactNode } from "react";
import { beforeEach, expect, test } from "vitest";
import { z } from "zod";
import { dropDraft, keepDraft, rememberAccount } from "../../../offline/index.ts";
import { draftsWritten, useLiveDraft } from "./use-live-draft.ts";

const shape = z.object({ text: z.string(), count: z.number() });
let accounts = 0;

function open() {
  const client = new QueryClient();
  const wrapper = ({ children }: { children: ReactNode }) => (
    <QueryClientProvider client={client}>{children}</QueryClientProvider>
  );
  return renderHook(() => useLiveDraft("bike", "form", shape), { wrapper });
}

async function opened() {
  const hook = open();
  await waitFor(() => expect(hook.result.current.ready).toBe(true));
  return hook.result;
}

beforeEach(() => {
  rememberAccount({ id: `rider-${++accounts}`, name: "Wren", email: "wren@moor.example" });
});

test("has no draft until one is set, and keeps it for whoever opens the form next", async () => {
  const first = await opened();
  expect(first.current.draft).toBeNull();
  act(() => first.current.set({ text: "a", count: 1 }));
  expect(first.current.draft).toEqual({ text: "a", count: 1 });
  await act(draftsWritten);
  const second = await opened();
  expect(second.current.draft).toEqual({ text: "a", count: 1 });
});

test("builds a second change on the first, though the page was not drawn in between", async () => {
  const live = await opened();
  act(() => live.current.set({ text: "a", count: 1 }));
  act(() => {
    live.current.change((draft) => ({ ...draft, text: "b" }));
    live.current.change((draft) => ({ ...draft, count: 2 }));
  });
  expect(live.current.draft).toEqual({ text: "b", count: 2 });
  await act(draftsWritten);
  expect((await opened()).current.draft).toEqual({ text: "b", count: 2 });
});

test("changes a first draft where there is none, if one is given", async () => {
  const live = await opened();
  act(() => live.current.change((draft) => ({ ...draft, count: 2 })));
  expect(live.current.draft).toBeNull();
  act(() => live.current.change((draft) => ({ ...draft, count: 2 }), { text: "a", count: 1 }));
  expect(live.current.draft).toEqual({ text: "a", count: 2 });
  await act(draftsWritten);
});

test("sees what another page of the app writes or drops", async () => {
  const live = await opened();
  act(() => live.current.set({ text: "a", count: 1 }));
  await act(draftsWritten);
  await act(() => keepDraft("bike", "form", { text: "other", count: 3 }));
  await waitFor(() => expect(live.current.draft).toEqual({ text: "other", count: 3 }));
  await act(() => dropDraft("bike", "form"));
  await waitFor(() => expect(live.current.draft).toBeNull());
});

test("takes a draft that this version cannot read for none, and shows what is stored", async () => {
  await keepDraft("bike", "form", { hoseMaybeOff: true });
  const live = await opened();
  expect(live.current.draft).toBeNull();
  expect(live.current.stored).toEqual({ hoseMaybeOff: true });
});
