import { useState, type KeyboardEvent, type PointerEvent } from "react";
import type { BikeRecord } from "../../../offline/index.ts";
import { BackIcon, OnwardIcon } from "../../../ui/icons.tsx";
import type { DeliveryHistory } from "../history/delivery-history.ts";
import { ChartBreaks } from "./chart-breaks.tsx";
import { chartFrame, type ChartFrame } from "./chart-frame.ts";
import { ChartGround } from "./chart-ground.tsx";
import { ChartKey } from "./chart-key.tsx";
import { chartModel, type ChartModel } from "./chart-model.ts";
import { ChartPoints } from "./chart-points.tsx";
import { ChartTrend } from "./chart-trend.tsx";
import { nearestPoint } from "./nearest-point.ts";
import { pointSentence } from "./point-sentence.ts";
import { StepButton } from "./step-button.tsx";
import { stepPoint } from "./step-point.ts";
import { trendSentence } from "./trend-sentence.ts";
import { useChartSize } from "./use-chart-size.ts";

interface Props {
  record: BikeRecord;
  history: DeliveryHistory;
}

/** Delivery against the baseline over engine hours; the table below it says the same. */
export default function DeliveryChart({ record, history }: Props) {
  const model = chartModel(history, record.summary.trend);
  if (model.points.length === 0) return <p>No check can be drawn yet.</p>;
  return <Chart record={record} model={model} />;
}

function Chart({ record, model }: { record: BikeRecord; model: ChartModel }) {
  const { meterFormat } = record.details;
  const { points } = model;
  const [entryId, setEntryId] = useState<string | null>(null);
  const found = points.findIndex((point) => point.entryId === entryId);
  const index = found < 0 ? points.length - 1 : found;
  const chosen = points[index]!;
  const choose = (next: number) => setEntryId(points[next]?.entryId ?? null);

  return (
    <figure className="flex flex-col gap-2">
      <Plot model={model} index={index} onChoose={choose} />
      <div className="flex items-center gap-2">
        <StepButton name="Earlier check" spent={index === 0} onStep={() => choose(index - 1)}>
          <BackIcon />
        </StepButton>
        <output className="min-w-0 flex-1">
          <span className="text-soft">
            {index + 1} of {points.length}.
          </span>{" "}
          {pointSentence(chosen, meterFormat)}
        </output>
        <StepButton
          name="Later check"
          spent={index === points.length - 1}
          onStep={() => choose(index + 1)}
        >
          <OnwardIcon />
        </StepButton>
      </div>
      <ChartKey model={model} />
      <figcaption>
        {trendSentence(record.summary.trend, meterFormat)}
        {model.undrawn > 0 && ` ${undrawnWords(model.undrawn)}`}
      </figcaption>
    </figure>
  );
}

const undrawnWords = (count: number) =>
  count === 1
    ? "One check has no sure place here: the table has it."
    : `${count} checks have no sure place here: the table has them.`;

interface PlotProps {
  model: ChartModel;
  index: number;
  onChoose: (index: number) => void;
}

/** The drawing. Arrow keys, a tap or a drag choose a check. */
function Plot({ model, index, onChoose }: PlotProps) {
  const { ref, size } = useChartSize<HTMLDivElement>();
  const frame = size && chartFrame(model, size);
  const count = model.points.length;
  const onKeyDown = (event: KeyboardEvent) => {
    const next = stepPoint(event.key, index, count);
    if (next === null) return;
    event.preventDefault();
    onChoose(next);
  };
  const onPointer = (event: PointerEvent<HTMLDivElement>) => {
    if (!frame || (event.type === "pointermove" && event.buttons === 0)) return;
    const { left } = event.currentTarget.getBoundingClientRect();
    onChoose(nearestPoint(model.points, frame.x.invert(event.clientX - left)));
  };
  return (
    <div
      ref={ref}
      role="slider"
      tabIndex={0}
      aria-label="Delivery over engine hours, check by check"
      aria-valuemin={1}
      aria-valuemax={count}
      aria-valuenow={index + 1}
      aria-valuetext={`Check ${index + 1} of ${count}`}
      onKeyDown={onKeyDown}
      onPointerDown={onPointer}
      onPointerMove={onPointer}
      className="touch-pan-y rounded-card"
    >
      {frame && <Drawing frame={frame} model={model} index={index} />}
    </div>
  );
}

interface DrawingProps {
  frame: ChartFrame;
  model: ChartModel;
  index: number;
}

function Drawing({ frame, model, index }: DrawingProps) {
  return (
    <svg
      aria-hidden
      width={frame.width}
      height={frame.height}
      viewBox={`0 0 ${frame.width} ${frame.height}`}
      className="block max-w-full select-none"
    >
      <ChartGround frame={frame} model={model} />
      <ChartBreaks frame={frame} />
      {model.trend && <ChartTrend frame={frame} trend={model.trend} actLimit={model.actLimit} />}
      <ChartPoints frame={frame} model={model} chosen={model.points[index]!} />
    </svg>
  );
}
