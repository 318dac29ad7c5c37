/** The one button of a run: hit without looking. As high on a phone as letters of any size allow. */
export const bigActionClass = "min-h-[112px]! text-[min(2.5rem,11vw)]! sm:min-h-20!";
