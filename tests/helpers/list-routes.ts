import type { Express } from "express";

/** What is used here of an Express router's insides. */
interface Layer {
  route?: { path: string; methods: Record<string, boolean> };
  handle?: { stack?: Layer[] };
}

const namesOf = ({ path, methods }: NonNullable<Layer["route"]>) =>
  Object.keys(methods)
    .filter((method) => method !== "_all")
    .map((method) => `${method.toUpperCase()} ${path}`);

const listLayers = (layers: Layer[]): string[] =>
  layers.flatMap(({ route, handle }) =>
    route ? namesOf(route) : handle?.stack ? listLayers(handle.stack) : [],
  );

/** Every route that an app answers, as `GET /bikes/:bikeId`, without the path it is mounted at. */
export const listRoutes = (app: Express) =>
  listLayers((app as unknown as { router: { stack: Layer[] } }).router.stack);
