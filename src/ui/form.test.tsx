import { render, screen } from "@testing-library/react";
import { userEvent } from "@testing-library/user-event";
import { useState } from "react";
import { describe, expect, it, vi } from "vitest";
import { Fold } from "./fold.tsx";
import { Form } from "./form.tsx";
import { TextField } from "./text-field.tsx";
import { FieldErrors, useSubmit } from "./use-submit.ts";

function Example({ work }: { work: () => Promise<void> }) {
  const [year, setYear] = useState("");
  const { submit, busy, errors, problem } = useSubmit(work);
  return (
    <Form onSubmit={submit} problem={problem}>
      <TextField label="Name" error={errors.name} />
      <Fold title="More">
        <TextField
          label="Year"
          value={year}
          onChange={(event) => setYear(event.target.value)}
          error={errors.year}
        />
      </Fold>
      <button disabled={busy}>Save</button>
    </Form>
  );
}

const save = () => userEvent.click(screen.getByRole("button", { name: "Save" }));

describe("a form", () => {
  it("goes to the first wrong field, out of its fold, and says there what is wrong", async () => {
    render(<Example work={() => Promise.reject(new FieldErrors({ year: "Not a year." }))} />);
    await save();
    expect(screen.getByLabelText("Year")).toHaveFocus();
    expect(screen.getByLabelText("Year")).toHaveAccessibleDescription("Not a year.");
    expect(screen.queryByRole("alert")).not.toBeInTheDocument();
  });

  it("says what went wrong that is no field's fault, and keeps what was typed", async () => {
    const error = Object.assign(new Error("No network just now."), { code: "no-network" });
    render(<Example work={() => Promise.reject(error)} />);
    await userEvent.type(screen.getByLabelText("Year"), "1994");
    await save();
    expect(screen.getByRole("alert")).toHaveTextContent("No network just now.");
    expect(screen.getByLabelText("Year")).toHaveValue("1994");
  });

  it("finds field errors in a problem that the server answered", async () => {
    const error = Object.assign(new Error("Refused"), { problem: { errors: { name: "Taken." } } });
    render(<Example work={() => Promise.reject(error)} />);
    await save();
    expect(screen.getByLabelText("Name")).toHaveAccessibleDescription("Taken.");
  });

  it("tells a fault of the app as one, and logs it", async () => {
    const log = vi.spyOn(console, "error").mockImplementation(() => undefined);
    const fault = new TypeError("x is undefined");
    render(<Example work={() => Promise.reject(fault)} />);
    await save();
    expect(screen.getByRole("alert")).toHaveTextContent("What you typed is still here");
    expect(log).toHaveBeenCalledWith(fault);
    log.mockRestore();
    vi.spyOn(console, "error");
  });

  it("works once at a time", async () => {
    let runs = 0;
    let finish = () => {};
    const work = () => {
      runs += 1;
      return new Promise<void>((resolve) => (finish = resolve));
    };
    render(<Example work={work} />);
    await save();
    await save();
    expect(runs).toBe(1);
    finish();
  });
});
