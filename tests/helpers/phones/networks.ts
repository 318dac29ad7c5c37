/** Networks as they are: each takes `fetch`'s place between a phone and the server. */
import type { Network } from "./wired-phone.ts";

const cutOff = () => new TypeError("fetch failed");

const portalPage = () =>
  new Response("<h1>Welcome to our network</h1>", { headers: { "content-type": "text/html" } });

export const networks = {
  good: fetch,
  "no-request": () => Promise.reject(cutOff()),
  "no-answer": async (input, init) => {
    await fetch(input, init);
    throw cutOff();
  },
  twice: async (input, init) => {
    await fetch(input, init);
    return fetch(input, init);
  },
  portal: () => Promise.resolve(portalPage()),
} satisfies Record<string, Network>;

/** Holds every request, or every answer, back until `letThrough` is called. */
export function slowNetwork(holds: "request" | "answer"): {
  network: Network;
  letThrough: () => void;
} {
  let letThrough: () => void = () => undefined;
  const gate = new Promise<void>((resolve) => (letThrough = resolve));
  const network: Network = async (input, init) => {
    if (holds === "request") await gate;
    const answer = await fetch(input, init);
    if (holds === "answer") await gate;
    return answer;
  };
  return { network, letThrough };
}
