import { useQuery } from "@tanstack/react-query";
import { rememberAccount, useAccount } from "../../offline/index.ts";
import { readMe } from "./auth-calls.ts";

/** The account as the server knows it; missing until it could be asked. */
export function useMe() {
  const account = useAccount();
  return useQuery({
    queryKey: ["me", account?.id],
    queryFn: async () => {
      const me = await readMe();
      // An address may have been changed on another device.
      if (me.id === account?.id && me.email !== account.email) rememberAccount(me);
      return me;
    },
    networkMode: "always",
  });
}
