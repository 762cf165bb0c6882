import { join } from "node:path";
import { Resvg } from "@resvg/resvg-js";

/** Faces of the drawings. The last one lends the signs the text face lacks: the ohm, at most, at least. */
const faces = [
  "@expo-google-fonts/instrument-sans/400Regular/InstrumentSans_400Regular.ttf",
  "@expo-google-fonts/instrument-sans/600SemiBold/InstrumentSans_600SemiBold.ttf",
  "@expo-google-fonts/bitter/600SemiBold/Bitter_600SemiBold.ttf",
  "pdfmake/fonts/Roboto/Roboto-Regular.ttf",
];

// From the working folder and not by module resolution, which a bundler would rewrite.
const fontFiles = faces.map((face) => join(/*turbopackIgnore: true*/ process.cwd(), "node_modules", face));

/**
 * A drawing as PNG, `widthPx` wide. System fonts are never used, so the picture is the same on every machine.
 * @throws Error when the SVG cannot be read.
 */
export function rasterise(svg: string, widthPx: number): Uint8Array {
  const picture = new Resvg(svg, {
    fitTo: { mode: "width", value: widthPx },
    background: "#ffffff",
    font: { fontFiles, loadSystemFonts: false, defaultFontFamily: "Instrument Sans" },
  });
  return picture.render().asPng();
}
