import { render, screen } from "@testing-library/react";
import { userEvent } from "@testing-library/user-event";
import { useState } from "react";
import { expect, test } from "vitest";
import { emptyBikeForm } from "./bike-form.ts";
import { MakeFields } from "./make-fields.tsx";

function Make() {
  const [form, setForm] = useState(emptyBikeForm);
  const set = (change: Partial<typeof form>) => setForm((now) => ({ ...now, ...change }));
  return <MakeFields form={form} set={set} errors={{ "body.year": "Not a year." }} />;
}

test("steps the year, from this one where none is typed yet", async () => {
  render(<Make />);
  const year = screen.getByRole("textbox", { name: "Year" });
  await userEvent.click(screen.getByRole("button", { name: "Year: less" }));
  const thisYear = new Date().getFullYear();
  expect(year).toHaveValue(String(thisYear));
  await userEvent.click(screen.getByRole("button", { name: "Year: less" }));
  expect(year).toHaveValue(String(thisYear - 1));
  expect(year).toHaveAccessibleDescription("Not a year.");
});
