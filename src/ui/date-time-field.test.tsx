import { fireEvent, render, screen } from "@testing-library/react";
import { useState } from "react";
import { afterEach, describe, expect, it } from "vitest";
import { DateTimeField } from "./date-time-field.tsx";

const home = process.env.TZ;
afterEach(() => {
  process.env.TZ = home;
  if (home === undefined) delete process.env.TZ;
});

function When() {
  const [at, setAt] = useState("2026-06-01T12:00:30.000Z");
  return (
    <>
      <DateTimeField label="Read at" value={at} onChange={setAt} />
      <output>{at}</output>
    </>
  );
}

describe.each([
  ["Europe/Berlin", "2026-06-01T14:00", "2026-06-01T06:15:00.000Z"],
  ["America/St_Johns", "2026-06-01T09:30", "2026-06-01T10:45:00.000Z"],
  ["Asia/Kathmandu", "2026-06-01T17:45", "2026-06-01T02:30:00.000Z"],
])("DateTimeField in %s", (zone, shown, quarterPastEight) => {
  it("shows the moment on the rider's clock and answers the instant of another", () => {
    process.env.TZ = zone;
    render(<When />);
    const field = screen.getByLabelText("Read at");
    expect(field).toHaveValue(shown);
    fireEvent.change(field, { target: { value: "2026-06-01T08:15" } });
    expect(screen.getByRole("status")).toHaveTextContent(quarterPastEight);
  });
});

describe("DateTimeField", () => {
  it("keeps the moment to the second while nobody touches it", () => {
    render(<When />);
    expect(screen.getByRole("status")).toHaveTextContent("2026-06-01T12:00:30.000Z");
  });

  it("puts back a date that was left half typed", () => {
    process.env.TZ = "UTC";
    render(<When />);
    const field = screen.getByLabelText("Read at");
    fireEvent.change(field, { target: { value: "" } });
    fireEvent.blur(field);
    expect(field).toHaveValue("2026-06-01T12:00");
    expect(screen.getByRole("status")).toHaveTextContent("2026-06-01T12:00:30.000Z");
  });
});
