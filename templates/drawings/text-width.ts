/**
 * Advance widths of Instrument Sans, thousandths of an em, for the characters from space to tilde.
 * Drawings are made without a browser, so they must know how long a label will be. A test holds these
 * figures against the font file.
 */
const regular = [
  200, 273, 384, 716, 608, 786, 755, 232, 406, 406, 408, 531, 255, 506, 255, 443, 666, 391, 545, 574, 600, 574, 599,
  532, 582, 610, 255, 255, 531, 531, 531, 567, 853, 728, 636, 741, 752, 638, 602, 765, 736, 254, 455, 692, 588, 906,
  736, 786, 656, 787, 656, 608, 648, 712, 728, 1089, 688, 676, 623, 406, 443, 406, 531, 426, 354, 533, 606, 533, 606,
  564, 354, 606, 599, 240, 240, 535, 240, 922, 599, 584, 606, 606, 375, 473, 377, 589, 523, 767, 551, 523, 496, 406,
  242, 406, 531,
] as const;

const semibold = [
  193, 295, 449, 727, 637, 786, 768, 256, 439, 439, 430, 544, 275, 493, 275, 444, 677, 387, 557, 579, 615, 581, 615,
  561, 598, 619, 275, 275, 544, 544, 544, 580, 867, 733, 645, 747, 755, 630, 594, 764, 725, 254, 427, 712, 589, 898,
  725, 794, 667, 806, 664, 637, 664, 704, 733, 1087, 707, 700, 631, 439, 444, 439, 544, 466, 354, 558, 621, 552, 621,
  571, 370, 621, 612, 260, 260, 558, 260, 941, 612, 597, 621, 621, 390, 494, 406, 604, 536, 800, 587, 536, 513, 439,
  234, 439, 544,
] as const;

/** Signs of the fallback face, and the dashes and quotation marks of the text face at their wider weight. */
const signs: Readonly<Record<string, number>> = {
  "\u03A9": 665,
  "\u2264": 508,
  "\u2265": 523,
  "\u00B2": 367,
  "\u00B3": 367,
  "\u00B5": 567,
  "\u2013": 599,
  "\u2019": 275,
  "\u00D7": 544,
  "\u00B0": 386,
};

/** Widest letter that the tables do not list: accented capitals and the symbols of the fallback face stay below it. */
const unlisted = 820;

/** Length of a label in the unit of `size`. Kerning is left out, so a real label is never much longer. */
export function textWidth(text: string, size: number, strong = false): number {
  const table = strong ? semibold : regular;
  let sum = 0;
  for (const character of text) sum += table[character.charCodeAt(0) - 32] ?? signs[character] ?? unlisted;
  return (sum * size) / 1000;
}

/** The label cut to a length, with three dots where it was cut. */
export function fitted(text: string, size: number, most: number, strong = false): string {
  if (textWidth(text, size, strong) <= most) return text;
  const characters = [...text];
  while (characters.length > 1 && textWidth(`${characters.join("").trimEnd()}...`, size, strong) > most)
    characters.pop();
  return `${characters.join("").trimEnd()}...`;
}

/** The label broken into lines no longer than `most`; a word too long for a line is cut. */
export function wrapped(text: string, size: number, most: number, mostLines: number, strong = false): string[] {
  const lines: string[] = [];
  for (const word of text.split(" ")) {
    const last = lines.at(-1);
    const longer = last === undefined ? word : `${last} ${word}`;
    if (last !== undefined && textWidth(longer, size, strong) <= most) lines[lines.length - 1] = longer;
    else lines.push(word);
  }
  const kept = lines.slice(0, mostLines);
  if (lines.length > mostLines) kept[mostLines - 1] = `${kept[mostLines - 1]} ...`;
  return kept.map((line) => fitted(line, size, most, strong));
}
