import type { Group } from "@/lib/notify/result";

/** The families in the order an assessment shows them. */
export const groupName: Record<Group, string> = {
  route: "Route",
  generation: "Generation",
  demand: "Demand",
  supply: "Supply",
  circuit: "Circuit",
  "open-pen": "Earthing and open PEN",
  "power-quality": "Power quality",
  settings: "Smart-charging settings",
};
