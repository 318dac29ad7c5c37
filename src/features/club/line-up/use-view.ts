import { useEffect, useState } from "react";
import { useLocation, useSearchParams } from "react-router-dom";
import { rememberLineUp } from "../../../ui/last-line-up.ts";
import { isShow, type ShowName } from "./line-up-views.ts";

export interface View {
  find: string;
  show: ShowName;
  /** A column's name; `worst` is the board's own order. */
  order: string;
  descending: boolean;
}

function readView(search: URLSearchParams): View {
  const show = search.get("show");
  return {
    find: search.get("find") ?? "",
    show: isShow(show) ? show : "all",
    order: search.get("order") ?? "worst",
    descending: search.has("descending"),
  };
}

const asSearch = ({ find, show, order, descending }: View) => ({
  ...(find && { find }),
  ...(show !== "all" && { show }),
  ...(order !== "worst" && { order }),
  ...(descending && { descending: "" }),
});

/**
 * What of the board is looked at. The address holds it too, so that it outlives a reload and the
 * way back from a bike leads to it; but the address is slower than typing.
 */
export function useView(): [View, (change: Partial<View>) => void] {
  const [search, setSearch] = useSearchParams();
  const [view, setView] = useState(() => readView(search));
  const { pathname, search: query } = useLocation();
  useEffect(() => rememberLineUp(pathname + query), [pathname, query]);
  const change = (changed: Partial<View>) => {
    const next = { ...view, ...changed };
    setView(next);
    setSearch(asSearch(next), { replace: true });
  };
  return [view, change];
}
