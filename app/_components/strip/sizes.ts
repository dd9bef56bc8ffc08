/** The strip's one size scale, in px: in a table's row, on a node, in a formula's line, on the material's own page. */
export const STRIP_SIZES = {
  table: { width: 11, height: 40, most: 4, hatched: false },
  node: { width: 8, height: 26, most: 4, hatched: false },
  line: { width: 18, height: 72, most: 6, hatched: false },
  page: { width: 72, height: 440, most: 9, hatched: true },
} as const;

export type StripSize = keyof typeof STRIP_SIZES;

/** The end that the fingers hold stays blank paper. */
export const BLANK_END = 0.16;
