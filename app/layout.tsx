import type { Metadata, Viewport } from "next";
import localFont from "next/font/local";
import { connection } from "next/server";
import type { ReactNode } from "react";
import "./globals.css";

// The mono face stands second in every stack and fills in the signs the other two lack, so no adjusted fallback
// face may come between them.
const bitter = localFont({
  src: "../node_modules/@fontsource-variable/bitter/files/bitter-latin-wght-normal.woff2",
  variable: "--face-bitter",
  weight: "100 900",
  display: "block",
  adjustFontFallback: false,
});
const instrument = localFont({
  src: "../node_modules/@fontsource-variable/instrument-sans/files/instrument-sans-latin-wdth-normal.woff2",
  variable: "--face-instrument",
  weight: "400 700",
  declarations: [{ prop: "font-stretch", value: "75% 100%" }],
  display: "block",
  adjustFontFallback: false,
});
const splineMono = localFont({
  src: "../node_modules/@fontsource-variable/spline-sans-mono/files/spline-sans-mono-latin-wght-normal.woff2",
  variable: "--face-spline-mono",
  weight: "300 700",
  display: "block",
  adjustFontFallback: false,
});

export const metadata: Metadata = {
  title: { template: "%s, Sealwire", default: "Sealwire" },
  description: "Chargepoint jobs recorded, assessed, sealed and followed to the network operator's answer.",
  formatDetection: { telephone: false },
};

export const viewport: Viewport = { width: "device-width", initialScale: 1, themeColor: "#f5f2ea" };

export default async function RootLayout({ children }: { children: ReactNode }) {
  // Every page is rendered for its request: a page made at build time could not carry the policy's nonce.
  await connection();
  return (
    <html lang="en-GB" className={`${bitter.variable} ${instrument.variable} ${splineMono.variable}`}>
      <body>{children}</body>
    </html>
  );
}
