import localFont from "next/font/local";

// One call per script: a browser then fetches only the files whose letters the page has.
// No fallback metrics: a fallback family would draw the Greek before the Greek file is asked.
const latin = localFont({
  src: "./commissioner-latin-full-normal.woff2",
  variable: "--face-latin",
  weight: "100 900",
  display: "swap",
  adjustFontFallback: false,
  declarations: [
    {
      prop: "unicode-range",
      value: "U+0000-00FF, U+0131, U+0152-0153, U+02BB-02BC, U+02C6, U+02DA, U+02DC, U+2000-206F, U+20AC, U+2212",
    },
  ],
});

const latinExtended = localFont({
  src: "./commissioner-latin-ext-full-normal.woff2",
  variable: "--face-latin-extended",
  weight: "100 900",
  display: "swap",
  preload: false,
  adjustFontFallback: false,
  declarations: [{ prop: "unicode-range", value: "U+0100-0130, U+0132-0151, U+0154-02BA, U+1E00-1E9F, U+1EF2-1EFF" }],
});

const greek = localFont({
  src: "./commissioner-greek-full-normal.woff2",
  variable: "--face-greek",
  weight: "100 900",
  display: "swap",
  preload: false,
  adjustFontFallback: false,
  declarations: [{ prop: "unicode-range", value: "U+0370-03FF" }],
});

const code = localFont({
  src: "./source-code-pro-latin-wght-normal.woff2",
  variable: "--face-code",
  weight: "200 900",
  display: "swap",
  preload: false,
  adjustFontFallback: false,
});

/** Class names that define the four font variables used by the tokens. */
export const fontVariables = [latin.variable, latinExtended.variable, greek.variable, code.variable].join(" ");
