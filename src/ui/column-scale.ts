export interface Scale {
  /** The highest mark. */
  maxMl: number;
  /** The step between two marks. */
  graduationMl: number;
}

/** Barrels as they are commonly sold. */
export const usualScales: readonly Scale[] = [
  { maxMl: 1, graduationMl: 0.05 },
  { maxMl: 2.5, graduationMl: 0.1 },
  { maxMl: 5, graduationMl: 0.2 },
  { maxMl: 10, graduationMl: 0.5 },
  { maxMl: 20, graduationMl: 1 },
  { maxMl: 50, graduationMl: 1 },
];

/** A barrel to draw where none is known: the smallest that holds all of `volumesMl` with room. */
export function usualScale(...volumesMl: (number | null)[]): Scale {
  const highest = Math.max(0, ...volumesMl.map((volume) => volume ?? 0));
  const fitting = usualScales.find((scale) => highest <= 0.9 * scale.maxMl);
  return fitting ?? { maxMl: Math.ceil(highest * 1.2), graduationMl: Math.ceil(highest / 20) };
}

const numberSteps = [1, 2, 5]
  .map((digit) => [0.1, 1, 10, 100].map((power) => digit * power))
  .flat();
const isWhole = (number: number) => Math.abs(number - Math.round(number)) < 1e-6;

/** The step between two numbered marks: a round one, at most six on the barrel. */
export function numberStepMl({ maxMl, graduationMl }: Scale): number {
  const fits = (step: number) => maxMl / step <= 6 && isWhole(step / graduationMl);
  return numberSteps.sort((a, b) => a - b).find(fits) ?? 5 * graduationMl;
}

export interface Mark {
  ml: number;
  numbered: boolean;
}

/** The marks of a barrel from zero up. Where they would run together, the numbered ones only. */
export function marks(scale: Scale, most: number): Mark[] {
  const numberEach = Math.round(numberStepMl(scale) / scale.graduationMl);
  const count = Math.floor(scale.maxMl / scale.graduationMl + 1e-6);
  const all = Array.from({ length: count + 1 }, (_, index) => ({
    ml: Number((index * scale.graduationMl).toFixed(6)),
    numbered: index % numberEach === 0,
  }));
  return all.length > most ? all.filter((mark) => mark.numbered) : all;
}
