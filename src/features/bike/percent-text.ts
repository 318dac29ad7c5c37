/** A fraction as a number of percent, without rounding dust: 0.075 is `7.5`. */
export const percentText = (fraction: number) => String(Number((100 * fraction).toFixed(2)));
