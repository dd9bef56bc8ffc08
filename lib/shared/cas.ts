/** Why this is not a CAS number, as a sentence; null when it is one. */
export function casFault(cas: string): string | null {
  const parts = /^(\d{2,7})-(\d{2})-(\d)$/.exec(cas);
  if (!parts) return `CAS number “${cas}” must look like 106-22-9: two to seven digits, two digits, one digit.`;
  const expected = casCheckDigit(`${parts[1]}${parts[2]}`);
  if (Number(parts[3]) === expected) return null;
  return `CAS number ${cas} has a wrong check digit: with these digits it would end in ${expected}. One of them is mistyped.`;
}

/** The last digit: the digits before it, from the right, times 1, 2, 3 ..., summed, modulo 10. */
export function casCheckDigit(digits: string): number {
  let sum = 0;
  for (let place = 1; place <= digits.length; place++) sum += place * Number(digits.at(-place));
  return sum % 10;
}
