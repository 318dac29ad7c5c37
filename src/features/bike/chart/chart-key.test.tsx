import { render, screen } from "@testing-library/react";
import { expect, test } from "vitest";
import { logbook } from "../../../../tests/helpers/logbook-in-words.ts";
import { deliveryHistory } from "../history/delivery-history.ts";
import { chartModel } from "./chart-model.ts";
import { ChartKey } from "./chart-key.tsx";

test("names the delivery at both limits, so that neither reads as the oil level", () => {
  const { entries } = logbook().bike({ name: "Moss" }).check(12, [3]).check(32, [2.9]);
  render(<ChartKey model={chartModel(deliveryHistory("owner", entries), null)} />);
  expect(screen.getByText(/below 92\s%$/)).toHaveTextContent(/^Delivery dropping below 92 %$/);
  expect(screen.getByText(/below 85\s%$/)).toHaveTextContent(/^Delivery low below 85 %$/);
});
