import { render, screen } from "@testing-library/react";
import { describe, expect, it } from "vitest";
import { Column } from "./column.tsx";
import { columnSentence } from "./column-sentence.ts";

const scale = { maxMl: 5, graduationMl: 0.2 };
const spaced = (text: string) => text.replaceAll("\u00a0", " ");

describe("columnSentence", () => {
  it("says the reading, its uncertainty, the limit and the baseline", () => {
    const reading = { readingMl: 2.5, uMl: 0.06, baselineMl: 3, limitMl: 2.55 };
    expect(spaced(columnSentence(reading))).toBe(
      "Delivery 2.50 mL a run, give or take 0.12 mL: under the limit of 2.55 mL; baseline 3.00 mL.",
    );
    expect(spaced(columnSentence({ ...reading, readingMl: 2.55 }))).toContain("at or above");
  });

  it("says only what is known", () => {
    expect(spaced(columnSentence({ readingMl: 3 }))).toBe("Delivery 3.00 mL a run.");
    expect(columnSentence({ readingMl: null })).toBe("Nothing measured yet.");
  });
});

describe("Column", () => {
  it("has a text alternative that says what it shows", () => {
    render(<Column scale={scale} size="small" readingMl={2.9} uMl={0.05} baselineMl={3} />);
    const picture = screen.getByRole("img");
    expect(spaced(picture.getAttribute("aria-label") ?? "")).toBe(
      "Delivery 2.90 mL a run, give or take 0.10 mL: baseline 3.00 mL.",
    );
  });

  it("names its lines and numbers its marks when large", () => {
    render(<Column scale={scale} size="large" readingMl={2.9} baselineMl={3} limitMl={2.55} />);
    expect(screen.getByText("baseline", { exact: false })).toHaveTextContent("baseline 3.00");
    expect(screen.getByText("limit", { exact: false })).toHaveTextContent("limit 2.55");
    expect(screen.getByText("5")).toBeInTheDocument();
  });

  it("draws no oil where nothing was measured, and stays in its frame above the last mark", () => {
    const { container, rerender } = render(<Column scale={scale} size="small" readingMl={null} />);
    expect(container.querySelector("clipPath")).toBeNull();
    rerender(<Column scale={scale} size="small" readingMl={50} />);
    const oil = container.querySelector("g[clip-path] rect");
    expect(Number(oil?.getAttribute("y"))).toBeGreaterThan(0);
  });
});
