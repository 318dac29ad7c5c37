import { cleanup, render, screen } from "@testing-library/react";
import { create } from "qrcode";
import { afterEach, expect, it } from "vitest";
import QrCode from "./qr-code.tsx";

afterEach(cleanup);

/** The dark modules that a path of bars covers, as `row,column`. */
function covered(path: string): string[] {
  return [...path.matchAll(/M(\d+) (\d+)h(\d+)v1h-(\d+)z/g)].flatMap(([, from, row, length]) =>
    Array.from({ length: Number(length) }, (_, index) => `${row},${Number(from) + index}`),
  );
}

it("draws each dark module of the code once, and no other", () => {
  const text = "https://club.example/join?token=abcdefghijklmnopqrstuv";
  render(<QrCode text={text} />);
  const path = screen.getByRole("img").querySelector("path")?.getAttribute("d") ?? "";
  const { size, data } = create(text, { errorCorrectionLevel: "M" }).modules;
  const dark = [...data].flatMap((module, index) =>
    module ? [`${Math.floor(index / size)},${index % size}`] : [],
  );
  expect(covered(path)).toEqual(dark);
});
