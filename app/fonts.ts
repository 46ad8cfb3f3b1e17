import localFont from 'next/font/local';

// Next reads these calls without running them, so each value has to be written out as a literal.
// Greek and Latin Extended stand before Latin in the family lists of globals.css: their unicode ranges
// keep them to their own letters, while the adjusted fallback of Latin would take every letter.

const sansLatin = localFont({
  src: '../node_modules/@fontsource-variable/source-sans-3/files/source-sans-3-latin-wght-normal.woff2',
  weight: '200 900',
  display: 'swap',
  adjustFontFallback: 'Arial',
  variable: '--font-sans-latin',
});

const sansGreek = localFont({
  src: '../node_modules/@fontsource-variable/source-sans-3/files/source-sans-3-greek-wght-normal.woff2',
  weight: '200 900',
  display: 'swap',
  adjustFontFallback: false,
  preload: false,
  declarations: [
    {
      prop: 'unicode-range',
      value: 'U+0370-0377,U+037A-037F,U+0384-038A,U+038C,U+038E-03A1,U+03A3-03FF',
    },
  ],
  variable: '--font-sans-greek',
});

const sansExt = localFont({
  src: '../node_modules/@fontsource-variable/source-sans-3/files/source-sans-3-latin-ext-wght-normal.woff2',
  weight: '200 900',
  display: 'swap',
  adjustFontFallback: false,
  preload: false,
  declarations: [
    {
      prop: 'unicode-range',
      value:
        'U+0100-0130,U+0132-0151,U+0154-02BA,U+02BD-02C5,U+02C7-02CC,U+02CE-02D7,U+02DD-02FF,U+1E00-1E9F,U+1EF2-1EFF,U+20A0-20AB,U+20AD-20C0,U+2113,U+2C60-2C7F,U+A720-A7FF',
    },
  ],
  variable: '--font-sans-ext',
});

const serifLatin = localFont({
  src: '../node_modules/@fontsource-variable/source-serif-4/files/source-serif-4-latin-wght-normal.woff2',
  weight: '200 900',
  display: 'swap',
  adjustFontFallback: 'Times New Roman',
  variable: '--font-serif-latin',
});

const serifGreek = localFont({
  src: '../node_modules/@fontsource-variable/source-serif-4/files/source-serif-4-greek-wght-normal.woff2',
  weight: '200 900',
  display: 'swap',
  adjustFontFallback: false,
  preload: false,
  declarations: [
    {
      prop: 'unicode-range',
      value: 'U+0370-0377,U+037A-037F,U+0384-038A,U+038C,U+038E-03A1,U+03A3-03FF',
    },
  ],
  variable: '--font-serif-greek',
});

const serifExt = localFont({
  src: '../node_modules/@fontsource-variable/source-serif-4/files/source-serif-4-latin-ext-wght-normal.woff2',
  weight: '200 900',
  display: 'swap',
  adjustFontFallback: false,
  preload: false,
  declarations: [
    {
      prop: 'unicode-range',
      value:
        'U+0100-0130,U+0132-0151,U+0154-02BA,U+02BD-02C5,U+02C7-02CC,U+02CE-02D7,U+02DD-02FF,U+1E00-1E9F,U+1EF2-1EFF,U+20A0-20AB,U+20AD-20C0,U+2113,U+2C60-2C7F,U+A720-A7FF',
    },
  ],
  variable: '--font-serif-ext',
});

const serifItalic = localFont({
  src: '../node_modules/@fontsource-variable/source-serif-4/files/source-serif-4-latin-wght-italic.woff2',
  weight: '200 900',
  style: 'italic',
  display: 'swap',
  adjustFontFallback: false,
  preload: false,
  variable: '--font-serif-italic',
});

/** Class names for the html element; they define the --font-* properties used in globals.css. */
export const fontVariables = [sansLatin, sansGreek, sansExt, serifLatin, serifGreek, serifExt, serifItalic]
  .map((font) => font.variable)
  .join(' ');
