const day = new Intl.DateTimeFormat('en-GB', {
	day: 'numeric',
	month: 'long',
	year: 'numeric',
	timeZone: 'UTC',
});

/** `1 December 2026`, in universal time: a sheet reads the same wherever it is drawn. */
export const dayInWords = (date: Date): string => day.format(date);
