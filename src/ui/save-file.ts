export const asJson = (content: unknown): Blob =>
  new Blob([JSON.stringify(content, null, 2)], { type: "application/json" });

/** Hands a file to the browser to be saved. */
export function saveFile(content: Blob, name: string): void {
  const url = URL.createObjectURL(content);
  const link = document.createElement("a");
  link.href = url;
  link.download = name;
  link.click();
  // The browser reads the file after the click; letting go at once loses it in some.
  setTimeout(() => URL.revokeObjectURL(url), 60_000);
}
