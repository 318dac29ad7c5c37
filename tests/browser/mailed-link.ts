import { expect, type Served } from "./fixtures.ts";

const links = (html: string) => [
  ...html.matchAll(/href="([^"]+)"[^>]*>([^<]*)(?:<\/a> to ([^<]*))?/g),
];

/**
 * The link of the newest mail of this subject, to whoever or to that address, as the server keeps it
 * where no mail goes out.
 */
export async function mailedLink({ origin }: Served, subject: string, to = ""): Promise<string> {
  const read = async (pathname: string) =>
    (await fetch(origin + pathname, { headers: { connection: "close" } })).text();
  const newest = async () =>
    links(await read("/dev/mail")).find(
      ([, , words, address]) => words!.includes(subject) && address!.includes(to),
    )?.[1];
  await expect.poll(newest).toBeTruthy();
  const letter = await read((await newest())!);
  return links(letter)[0]![1]!;
}
