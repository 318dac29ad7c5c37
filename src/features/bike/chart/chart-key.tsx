import type { ReactNode } from "react";
import { formatPercent } from "../../../ui/format-quantity.ts";
import { verdictWords } from "../../../ui/words.ts";
import type { ChartModel } from "./chart-model.ts";
import { levelLooks } from "./level-looks.ts";
import { PointMark } from "./point-mark.tsx";

const order = ["settling", "holding", "dropping", "low", null] as const;

/** What the marks and lines on the chart mean. */
export function ChartKey({ model }: { model: ChartModel }) {
  const present = new Set(model.points.map(({ verdict }) => verdict));
  return (
    <ul className="flex flex-wrap gap-x-4 gap-y-1 text-sm text-soft">
      {order
        .filter((verdict) => present.has(verdict))
        .map((verdict) => (
          <Item key={verdict} drawn={<PointMark verdict={verdict} />}>
            {verdict ? verdictWords[verdict] : "Struck"}
          </Item>
        ))}
      <Item drawn={<Level look="baseline" />}>Baseline</Item>
      <Item drawn={<Level look="watch" />}>
        Delivery dropping below {formatPercent(model.watchLimit)}
      </Item>
      <Item drawn={<Level look="act" />}>Delivery low below {formatPercent(model.actLimit)}</Item>
      <Item drawn={<path d="M-3 -8h6m-3 0v16m-3 0h6" stroke="var(--ink)" strokeWidth="1.5" />}>
        Give or take: 19 of 20 lie within
      </Item>
    </ul>
  );
}

function Item({ drawn, children }: { drawn: ReactNode; children: ReactNode }) {
  return (
    <li className="inline-flex items-center gap-1">
      <svg aria-hidden viewBox="-9 -9 18 18" className="size-5 shrink-0">
        {drawn}
      </svg>
      <span>{children}</span>
    </li>
  );
}

function Level({ look }: { look: keyof typeof levelLooks }) {
  const { ink, dashes } = levelLooks[look];
  return <path d="M-9 0h18" stroke={ink} strokeWidth="2.5" strokeDasharray={dashes} />;
}
