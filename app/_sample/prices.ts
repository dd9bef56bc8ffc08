/** The prices that the public page lets one try, in EUR for what smells as strong as a kilogram of the target. */
export const PRICES = { min: 50, max: 5000, step: 25, first: 1500 } as const;
