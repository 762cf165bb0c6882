/** Pixels of the sheet; 700 across print as 170 mm, so 10 is a little under 7 points. */
export const sheet = { width: 700, tallest: 880 } as const;

export const column = {
  /** The wire down the intake, and the right edge of what stands beside it. */
  intake: 52,
  intakeRight: 168,
  /** Protective conductors and tails run down beside the boards. */
  earth: 184,
  tails: 204,
  board: 226,
  busbar: 262,
  device: 274,
  deviceText: 304,
  boardRight: 424,
  cableText: 432,
  cableRight: 528,
  unit: 562,
  unitRight: 696,
} as const;

export const text = { plain: 10, quiet: 10 } as const;

export const heights = { boardHead: 58, way: 78, unit: 62, unitGap: 10, electrode: 38, boardGap: 26 } as const;
