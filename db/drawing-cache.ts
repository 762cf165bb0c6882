import { rasterise } from "@/lib/server/rasterise";

/** Newest last. A picture is some 30 kB, so the whole is a few megabytes. */
const kept = new Map<string, Uint8Array>();
const mostKept = 64;

/**
 * `rasterise`, remembering the last few drawings: outcome marks stand in every document, a week's hours in many
 * packs. Drawing them anew is a third of a pack's time. The same drawing is the same picture, so nothing goes stale.
 */
export function rasteriseOnce(svg: string, widthPx: number): Uint8Array {
  const key = `${widthPx} ${svg}`;
  const picture = kept.get(key) ?? rasterise(svg, widthPx);
  kept.delete(key);
  kept.set(key, picture);
  const [oldest] = kept.keys();
  if (kept.size > mostKept && oldest) kept.delete(oldest);
  return picture;
}
