import type { BikeStanding } from "../logbook/bike-row.ts";
import type { LogbookChange } from "../logbook/database.ts";
import type { Phone } from "../logbook/phone.ts";

/** An answer being applied, in one transaction. */
export interface Applying {
  change: LogbookChange;
  phone: Phone;
  /** The bikes on this phone, as the answer leaves them. */
  bikes: Map<string, BikeStanding>;
  /** Those whose record must be made anew. */
  touched: Set<string>;
}
