import type { Blanks } from "@/components/job/items";
import { chargepointSchema } from "@/lib/notify/job/chargepoint";
import { boardSchema, circuitSchema } from "@/lib/notify/job/installation";

/** Items with no fact in them, as the record's own reader makes them. */
export const blankItems = (): Blanks => ({
  chargepoints: chargepointSchema.parse({ id: "new" }),
  circuits: circuitSchema.parse({ id: "new" }),
  boards: boardSchema.parse({ id: "new" }),
});
