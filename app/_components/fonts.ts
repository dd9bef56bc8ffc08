import localFont from 'next/font/local';

// Each face comes twice: the Latin file that every page needs, and the extended one, fetched only when a name asks for
// it. The ranges are written out each time because the compiler reads these calls without running them.

const sans = localFont({
  src: '../../node_modules/@fontsource-variable/instrument-sans/files/instrument-sans-latin-standard-normal.woff2',
  variable: '--font-instrument',
  weight: '400 700',
  declarations: [{ prop: 'font-stretch', value: '75% 100%' }],
  adjustFontFallback: 'Arial',
});

const sansExtended = localFont({
  src: '../../node_modules/@fontsource-variable/instrument-sans/files/instrument-sans-latin-ext-standard-normal.woff2',
  variable: '--font-instrument-ext',
  weight: '400 700',
  declarations: [
    { prop: 'font-stretch', value: '75% 100%' },
    {
      prop: 'unicode-range',
      value: 'U+0100-02BA, U+02BD-02C5, U+02C7-02CC, U+02CE-02D7, U+02DD-02FF, U+1D00-1DBF, U+1E00-1E9F, U+1EF2-1EFF',
    },
  ],
  preload: false,
  adjustFontFallback: false,
});

const serif = localFont({
  src: '../../node_modules/@fontsource-variable/newsreader/files/newsreader-latin-wght-italic.woff2',
  variable: '--font-newsreader',
  weight: '200 800',
  style: 'italic',
  preload: false,
  adjustFontFallback: 'Times New Roman',
});

const serifExtended = localFont({
  src: '../../node_modules/@fontsource-variable/newsreader/files/newsreader-latin-ext-wght-italic.woff2',
  variable: '--font-newsreader-ext',
  weight: '200 800',
  style: 'italic',
  declarations: [
    {
      prop: 'unicode-range',
      value: 'U+0100-02BA, U+02BD-02C5, U+02C7-02CC, U+02CE-02D7, U+02DD-02FF, U+1D00-1DBF, U+1E00-1E9F, U+1EF2-1EFF',
    },
  ],
  preload: false,
  adjustFontFallback: false,
});

export const fontClasses = [sans, sansExtended, serif, serifExtended].map((font) => font.variable).join(' ');
