import { parameter } from "../parameter";
import { throughEditions } from "./wiring-edition";

export const touchLimitV = parameter({
  id: "open-pen.touch-limit",
  unit: "V",
  meaning: "Voltage from the main earthing terminal to Earth that an open PEN may leave standing.",
  values: throughEditions(70, "722.411.4.1", "seen"),
});

export const windowLowV = parameter({
  id: "open-pen.window-low",
  unit: "V",
  meaning: "Line-neutral voltage below which a window device opens.",
  values: throughEditions(207, "722.411.4.1", "seen"),
});

export const windowHighV = parameter({
  id: "open-pen.window-high",
  unit: "V",
  meaning: "Line-neutral voltage above which a window device opens.",
  values: throughEditions(253, "722.411.4.1", "seen"),
});

export const earthDeviceOpensWithinS = parameter({
  id: "open-pen.earth-device-opens-within",
  unit: "s",
  meaning: "Longest opening time of a device that senses protective conductor to Earth.",
  values: throughEditions(5, "722.411.4.1", "seen"),
});

export const earthDeviceRidesThroughS = parameter({
  id: "open-pen.earth-device-rides-through",
  unit: "s",
  meaning: "Time above the limit that such a device need not act on.",
  values: throughEditions(4, "722.411.4.1", "seen"),
});

export const windowDeviceOpensWithinS = parameter({
  id: "open-pen.window-device-opens-within",
  unit: "s",
  meaning: "Longest opening time of a line-neutral window device.",
  values: throughEditions(5, "722.411.4.1", "from memory: verify"),
});

/** Methods the rules of the day listed. The line-neutral window and equivalent devices came with Amendment 1. */
export const deviceMethodsListed = parameter<readonly string[]>({
  id: "open-pen.device-methods-listed",
  unit: "method keys",
  meaning: "Device methods that 722.411.4.1 listed on the day.",
  values: [
    {
      from: "2018-07-01",
      to: "2020-01-31",
      value: ["cpc-earth-70V-device"],
      source: "BS 7671:2018 722.411.4.1",
      certainty: "seen",
    },
    {
      from: "2020-02-01",
      to: "2026-10-14",
      value: ["cpc-earth-70V-device", "line-neutral-window-device", "equivalent-device"],
      source: "BS 7671:2018+A1:2020 722.411.4.1",
      certainty: "seen",
    },
    {
      from: "2026-10-15",
      value: ["cpc-earth-70V-device", "line-neutral-window-device", "equivalent-device"],
      source: "BS 7671:2018+A4:2026 722.411.4.1",
      certainty: "from memory: verify",
    },
  ],
});

export const aboveGroundSeparationM = parameter({
  id: "earth.separation-above-ground",
  unit: "m",
  meaning: "Reach kept between parts of two earthing systems, measured from wherever the vehicle can stand.",
  values: throughEditions(2.5, "411.3.1.1", "seen"),
});

export const ttStableOhm = parameter({
  id: "earth.tt-stable",
  unit: "Ω",
  meaning: "Electrode resistance above which the reading may not be stable.",
  values: throughEditions(200, "Table 41.5", "seen"),
});

export const rcdTouchLimitV = parameter({
  id: "earth.rcd-touch-limit",
  unit: "V",
  meaning: "Product of electrode or loop impedance and residual operating current that may not be passed.",
  values: throughEditions(50, "411.5.3", "seen"),
});
