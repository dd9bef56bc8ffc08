/** Joins what is there: `classNames('a', wide && 'b')`. */
export function classNames(...parts: (string | false | null | undefined)[]): string {
  return parts.filter(Boolean).join(' ');
}
