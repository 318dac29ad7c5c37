import { render, screen } from "@testing-library/react";
import { userEvent } from "@testing-library/user-event";
import { useState } from "react";
import { describe, expect, it } from "vitest";
import type { MeterFormat } from "../../shared/schemas/entry.ts";
import { HoursField } from "./hours-field.tsx";
import { parseHours } from "./parse-hours.ts";

function Hours({ from, meterFormat }: { from: string; meterFormat: MeterFormat }) {
  const [text, setText] = useState(from);
  return (
    <>
      <HoursField
        label="Engine hours"
        error="Not yet."
        value={text}
        onChange={setText}
        meterFormat={meterFormat}
      />
      <output>{parseHours(text) ?? "none"}</output>
    </>
  );
}

describe("HoursField", () => {
  it("takes hours and minutes in two fields where the meter shows them", async () => {
    render(<Hours from="" meterFormat="hh:mm" />);
    await userEvent.type(screen.getByLabelText("Hours"), "2");
    await userEvent.type(screen.getByLabelText("Minutes"), "30");
    expect(screen.getByRole("status")).toHaveTextContent("2.5");
    expect(screen.getByRole("group", { name: "Engine hours" })).toHaveAccessibleDescription(
      "Not yet.",
    );
  });

  it("shows what it starts from", () => {
    render(<Hours from="12:05" meterFormat="hh:mm" />);
    expect(screen.getByLabelText("Hours")).toHaveValue("12");
    expect(screen.getByLabelText("Minutes")).toHaveValue("05");
  });

  it("steps hours and minutes where the meter shows them, an hour being 60 minutes", async () => {
    render(<Hours from="12:58" meterFormat="hh:mm" />);
    const press = (name: string) => userEvent.click(screen.getByRole("button", { name }));
    await press("Minutes: more");
    await press("Minutes: more");
    expect(screen.getByLabelText("Hours")).toHaveValue("13");
    expect(screen.getByLabelText("Minutes")).toHaveValue("00");
    await press("Minutes: less");
    await press("Hours: more");
    expect(screen.getByLabelText("Hours")).toHaveValue("13");
    expect(screen.getByLabelText("Minutes")).toHaveValue("59");
    for (let presses = 0; presses < 15; presses += 1) await press("Hours: less");
    expect(screen.getByRole("status")).toHaveTextContent(/^0$/);
  });

  it("steps hours and minutes from nothing", async () => {
    render(<Hours from="" meterFormat="hh:mm" />);
    await userEvent.click(screen.getByRole("button", { name: "Hours: more" }));
    expect(screen.getByRole("status")).toHaveTextContent(/^1$/);
  });

  it("steps by a tenth where the meter shows decimals", async () => {
    render(<Hours from="12.9" meterFormat="decimal" />);
    await userEvent.click(screen.getByRole("button", { name: "Engine hours: more" }));
    expect(screen.getByRole("status")).toHaveTextContent("13");
  });
});
