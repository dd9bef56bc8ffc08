/** The currencies that a house may calculate in, by ISO 4217. Apart from the schemas, so that a form needs no parser. */
export const CURRENCIES = ['EUR', 'USD', 'GBP', 'CHF', 'CAD', 'AUD', 'SEK', 'INR'] as const;
