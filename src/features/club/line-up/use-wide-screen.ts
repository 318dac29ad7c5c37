import { useSyncExternalStore } from "react";

const wide = window.matchMedia("(min-width: 900px)");

function subscribe(listener: () => void) {
  wide.addEventListener("change", listener);
  return () => wide.removeEventListener("change", listener);
}

/** Room for a table, where a phone has cards. */
export const useWideScreen = () => useSyncExternalStore(subscribe, () => wide.matches);
