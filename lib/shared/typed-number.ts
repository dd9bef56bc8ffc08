export type TypedNumber = { value: number | null } | { fault: string };

/**
 * Reads a number as people type it, with a decimal point or a decimal comma; nothing typed is null. Where a comma
 * could part thousands as well, it says so rather than being wrong by a thousand.
 */
export function typedNumber(text: string): TypedNumber {
  const plain = text.replace(/[\s\u00a0\u202f'’]/g, '').replace('−', '-');
  if (plain === '') return { value: null };
  if (/^-?[1-9]\d{0,2},\d{3}$/.test(plain)) {
    const whole = plain.replace(',', '');
    return { fault: `Write ${whole} or ${plain.replace(',', '.')}: the comma in ${plain} could mean either.` };
  }
  const number = Number(asDecimal(plain));
  return Number.isFinite(number) && /\d/.test(plain)
    ? { value: number }
    : { fault: `This is not a number: ${text.trim()}.` };
}

/** The last of point and comma is the decimal one when both are there, each other then parts thousands. */
function asDecimal(plain: string): string {
  if (!/^-?[\d.,]+$/.test(plain)) return 'no';
  const [point, comma] = [plain.lastIndexOf('.'), plain.lastIndexOf(',')];
  if (point < 0) return plain.indexOf(',') === comma ? plain.replace(',', '.') : parted(plain, ',');
  if (comma < 0) return plain.indexOf('.') === point ? plain : parted(plain, '.');
  const [parting, decimal] = (point > comma ? [',', '.'] : ['.', ',']) as [',' | '.', string];
  const [whole = '', fraction = ''] = [
    plain.slice(0, plain.lastIndexOf(decimal)),
    plain.slice(plain.lastIndexOf(decimal) + 1),
  ];
  return whole.includes(decimal) ? 'no' : `${parted(whole, parting)}.${fraction}`;
}

/** Whole thousands parted by one sign, as in 1,234,567; anything else is no number. */
function parted(text: string, sign: ',' | '.'): string {
  const [first = '', ...groups] = text.split(sign);
  const inOrder = /^-?\d{1,3}$/.test(first) && groups.every((group) => /^\d{3}$/.test(group));
  return inOrder ? first + groups.join('') : 'no';
}

/** The shortest text that reads back as this number, to so many digits: no thousands sign that could be misread. */
export function numberAsTyped(value: number | null, digits: number): string {
  return value === null || Number.isNaN(value) ? '' : String(Number(value.toFixed(digits)));
}
