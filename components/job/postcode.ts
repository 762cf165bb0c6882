const whole = /^([A-Z]{1,2}\d[A-Z\d]?)(\d[A-Z]{2})$/;
const bare = (typed: string) => typed.replace(/[\s\-–]/g, "").toUpperCase();

/** Outward and inward part both there. Spaces, hyphens and small letters do not matter. */
export const isWholePostcode = (typed: string) => whole.test(bare(typed));

/** "xa34ef" as it is printed, "XA3 4EF"; what is no whole postcode stays as typed. */
export function tidyPostcode(typed: string): string {
  const [, outward, inward] = whole.exec(bare(typed)) ?? [];
  return outward && inward ? `${outward} ${inward}` : typed;
}
