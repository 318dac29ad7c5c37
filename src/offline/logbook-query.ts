import { useQuery, useQueryClient, type UseQueryResult } from "@tanstack/react-query";
import { useEffect } from "react";
import { useAccount } from "./account.ts";
import { onAnnouncement, type LogbookTopic } from "./announcements.ts";
import type { LogbookDatabase } from "./logbook/database.ts";
import { phoneOf, type Phone } from "./logbook/phone.ts";

/**
 * Reads something from the signed-in account's logbook and reads it again whenever the logbook
 * changes, in this tab or another. The network has no part in it, and the persisted read cache
 * never holds it.
 */
export function useLogbookQuery<T>(
  what: readonly string[],
  read: (database: LogbookDatabase, phone: Phone) => Promise<T>,
  about: LogbookTopic = "entries",
): UseQueryResult<T> {
  const account = useAccount();
  const client = useQueryClient();
  const accountId = account?.id;
  const path = what.join("/");

  useEffect(
    () =>
      onAnnouncement((change) => {
        if (change.accountId !== accountId || change.about !== about) return;
        void client.invalidateQueries({ queryKey: ["logbook", accountId, path], exact: true });
      }),
    [client, accountId, path, about],
  );

  return useQuery({
    queryKey: ["logbook", accountId, path],
    enabled: account !== null,
    networkMode: "always",
    retry: false,
    staleTime: 0,
    queryFn: async () => {
      const phone = phoneOf(account!);
      return read(await phone.open(), phone);
    },
  });
}
