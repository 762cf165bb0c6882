const browsers = [
  ["Edge", /Edg(?:A|iOS)?\//],
  ["Firefox", /Firefox\/|FxiOS\//],
  ["Samsung Internet", /SamsungBrowser\//],
  ["Chrome", /Chrome\/|CriOS\//],
  ["Safari", /Safari\//],
] as const;

const systems = [
  ["iPhone", /iPhone/],
  ["iPad", /iPad/],
  ["Android", /Android/],
  ["Windows", /Windows/],
  ["Mac", /Macintosh/],
  ["Linux", /Linux/],
] as const;

const named = (table: readonly (readonly [string, RegExp])[], text: string) =>
  table.find(([, pattern]) => pattern.test(text))?.[0];

/** A User-Agent in words a person knows their own device by: "Chrome on Android". */
export function deviceName(userAgent: string | null): string {
  const browser = named(browsers, userAgent ?? "");
  const system = named(systems, userAgent ?? "");
  if (browser && system) return `${browser} on ${system}`;
  return browser ?? system ?? "Unknown device";
}
