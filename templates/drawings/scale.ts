/** Steps of a scale from nought that take in `top`: at most seven of them, each 1, 2 or 5 by a power of ten. */
export function stepsTo(top: number): number[] {
  const rough = Math.max(top, 1) / 6;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = [1, 2, 5, 10].map((each) => each * power).find((each) => each >= rough) ?? rough;
  const count = Math.ceil(top / step);
  return Array.from({ length: count + 1 }, (_, index) => Math.round(index * step * 1000) / 1000);
}
