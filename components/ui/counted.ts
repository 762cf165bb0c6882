/** "1 fact", "3 facts": a count with its noun, the plural given where an s does not do. */
export const counted = (count: number, one: string, many = `${one}s`) =>
  `${count.toLocaleString("en-GB")} ${count === 1 ? one : many}`;
