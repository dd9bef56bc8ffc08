const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'long', year: 'numeric', timeZone: 'UTC' });

/** "1 December 2026", of an instant. */
export const dayInWords = (instant: string): string => day.format(new Date(instant));
