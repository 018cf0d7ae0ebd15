import type { Metadata, Viewport } from "next";
import localFont from "next/font/local";
import { connection } from "next/server";
import type { ReactNode } from "react";
import { HatchDefs } from "@/components/ui/hatch-defs";
import "./globals.css";

const archivo = localFont({
  src: [
    {
      path: "../node_modules/@fontsource-variable/archivo/files/archivo-latin-standard-normal.woff2",
      weight: "100 900",
      style: "normal",
    },
  ],
  declarations: [
    { prop: "font-stretch", value: "62% 125%" },
    {
      prop: "unicode-range",
      value:
        "U+0000-00FF,U+0131,U+0152-0153,U+02BB-02BC,U+02C6,U+02DA,U+02DC,U+0304,U+0308,U+0329,U+2000-206F,U+20AC,U+2122,U+2191,U+2193,U+2212,U+2215,U+FEFF,U+FFFD",
    },
  ],
  variable: "--font-archivo-latin",
  display: "swap",
  adjustFontFallback: false,
});

const archivoExt = localFont({
  src: [
    {
      path: "../node_modules/@fontsource-variable/archivo/files/archivo-latin-ext-standard-normal.woff2",
      weight: "100 900",
      style: "normal",
    },
  ],
  declarations: [
    { prop: "font-stretch", value: "62% 125%" },
    {
      prop: "unicode-range",
      value:
        "U+0100-02BA,U+02BD-02C5,U+02C7-02CC,U+02CE-02D7,U+02DD-02FF,U+0304,U+0308,U+0329,U+1D00-1DBF,U+1E00-1E9F,U+1EF2-1EFF,U+2020,U+20A0-20AB,U+20AD-20C0,U+2113,U+2C60-2C7F,U+A720-A7FF",
    },
  ],
  variable: "--font-archivo-ext",
  display: "swap",
  preload: false,
  adjustFontFallback: false,
});

export const metadata: Metadata = {
  title: { default: "Curbweight", template: "%s · Curbweight" },
  description: "The shared ledger of a scrap-collecting outfit, from the curb to the sale ticket.",
};

export const viewport: Viewport = {
  width: "device-width",
  initialScale: 1,
  viewportFit: "cover",
  themeColor: [
    { media: "(prefers-color-scheme: light)", color: "#14201F" },
    { media: "(prefers-color-scheme: dark)", color: "#070C0B" },
  ],
};

/** The frame of every page: the face, the tokens, and the hatches that charts point at. */
export default async function RootLayout({ children }: { children: ReactNode }) {
  // Every page is made for its request, because the policy against foreign scripts gives each answer a nonce of its own.
  await connection();
  return (
    <html lang="en" className={`${archivo.variable} ${archivoExt.variable}`}>
      <body>
        <HatchDefs />
        {children}
      </body>
    </html>
  );
}
