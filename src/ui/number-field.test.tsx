import { render, screen } from "@testing-library/react";
import { userEvent } from "@testing-library/user-event";
import { useState } from "react";
import { describe, expect, it } from "vitest";
import { NumberField } from "./number-field.tsx";

function Level({ error }: { error?: string }) {
  const [text, setText] = useState("1.0");
  return (
    <NumberField
      label="End level"
      hint="At the bottom of the meniscus."
      error={error}
      value={text}
      onChange={setText}
      step={0.2}
      min={0}
      max={1.5}
      unit="mL"
    />
  );
}

describe("NumberField", () => {
  it("keeps what was typed, comma and all", async () => {
    render(<Level />);
    const field = screen.getByLabelText("End level");
    await userEvent.clear(field);
    await userEvent.type(field, "3,8");
    expect(field).toHaveValue("3,8");
  });

  it("replaces what stands there when one types into it", async () => {
    render(<Level />);
    const field = screen.getByLabelText("End level");
    await userEvent.click(field);
    await userEvent.keyboard("2.4");
    expect(field).toHaveValue("2.4");
  });

  it("steps up and down within its limits, by buttons that say what they do", async () => {
    render(<Level />);
    const field = screen.getByLabelText("End level");
    await userEvent.click(screen.getByRole("button", { name: "End level: more" }));
    expect(field).toHaveValue("1.2");
    for (let press = 0; press < 3; press += 1)
      await userEvent.click(screen.getByRole("button", { name: "End level: more" }));
    expect(field).toHaveValue("1.5");
    for (let press = 0; press < 9; press += 1)
      await userEvent.click(screen.getByRole("button", { name: "End level: less" }));
    expect(field).toHaveValue("0.0");
  });

  it("opens a decimal keyboard and is no number input, which would drop a comma", () => {
    render(<Level />);
    expect(screen.getByLabelText("End level")).toHaveAttribute("inputmode", "decimal");
    expect(screen.getByLabelText("End level")).toHaveAttribute("type", "text");
  });

  it("ties its hint and its error to the field", () => {
    render(<Level error="The end level is below the start level." />);
    const field = screen.getByLabelText("End level");
    expect(field).toBeInvalid();
    expect(field).toHaveAccessibleDescription(
      "At the bottom of the meniscus. The end level is below the start level.",
    );
  });
});
