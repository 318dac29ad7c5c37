import { useQuery, useQueryClient } from "@tanstack/react-query";
import type { ReactNode } from "react";
import { remindersResponseSchema, type Reminders } from "../../../shared/schemas/reminders.ts";
import { apiRequest } from "../../offline/index.ts";
import { Tick } from "../../ui/tick.tsx";
import { Notice } from "../../ui/notice.tsx";
import { useSubmit } from "../../ui/use-submit.ts";

const API = "/api/account/reminders";
const queryKey = ["reminders"];

async function callReminders(body?: Reminders): Promise<Reminders> {
  const schema = remindersResponseSchema;
  const request = body ? ({ method: "PUT", body, schema } as const) : { schema };
  return (await apiRequest(API, request)).reminders;
}

/** Which mails this account gets. */
export function ReminderChoice() {
  const { data, error } = useQuery({
    queryKey,
    queryFn: () => callReminders(),
    networkMode: "always",
    meta: { persist: true },
  });
  return (
    <section className="flex flex-col gap-1 border-t border-rule pt-4">
      <h2 className="text-xl">Reminders by e-mail</h2>
      <p>Sent only to an address that you have confirmed.</p>
      {data && <Ticks reminders={data} />}
      {!data && error && <p className="text-soft">{error.message}</p>}
    </section>
  );
}

function Ticks({ reminders }: { reminders: Reminders }) {
  const { dueMails, stopMails } = reminders;
  return (
    <>
      <ReminderTick change={{ ...reminders, dueMails: !dueMails }} checked={dueMails}>
        <strong className="block">A check falls due</strong>
        Before it is due, and while it is overdue; at most one a week for each bike.
      </ReminderTick>
      <ReminderTick change={{ ...reminders, stopMails: !stopMails }} checked={stopMails}>
        <strong className="block">A pump is found low, or a stop is advised</strong>
        At once: on your own bikes, and on those of your clubs where you are a mechanic.
      </ReminderTick>
    </>
  );
}

interface TickProps {
  /** The reminders with this one turned over. */
  change: Reminders;
  checked: boolean;
  children: ReactNode;
}

function ReminderTick({ change, checked, children }: TickProps) {
  const client = useQueryClient();
  const { submit, busy, problem } = useSubmit(async () => {
    client.setQueryData(queryKey, await callReminders(change));
  });
  return (
    <>
      <Tick checked={busy ? !checked : checked} onChange={() => void submit()}>
        {children}
      </Tick>
      {problem && <Notice tone="error" title={problem} />}
    </>
  );
}
