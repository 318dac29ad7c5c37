/** In units of the drawing: the barrel between its highest mark and zero. */
export interface Frame {
  width: number;
  height: number;
  left: number;
  right: number;
  top: number;
  zero: number;
  stroke: number;
  /** More marks than this would run together. */
  mostMarks: number;
  /** Room for numbers on the barrel and words beside it. */
  large: boolean;
}

export const frames = {
  small: {
    width: 72,
    height: 152,
    left: 15,
    right: 55,
    top: 14,
    zero: 130,
    stroke: 1.5,
    mostMarks: 26,
    large: false,
  },
  large: {
    width: 252,
    height: 348,
    left: 66,
    right: 136,
    top: 26,
    zero: 304,
    stroke: 2,
    mostMarks: 101,
    large: true,
  },
} satisfies Record<string, Frame>;

/** Above the highest mark, to the flange. */
export const NECK = 10;

/** The inside of the barrel: straight walls, then the taper to the plugged tip. */
export function barrelPath({ left, right, top, zero }: Frame): string {
  const middle = (left + right) / 2;
  const tip = (right - left) / 9;
  const taper = zero + (right - left) / 6;
  const foot = `L${middle - tip} ${taper}H${middle + tip}L${right} ${zero}`;
  return `M${left} ${top - NECK}V${zero}${foot}V${top - NECK}`;
}
