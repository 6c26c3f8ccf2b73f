/** How light the viewing booth is. The choice lives in a cookie, so that the first paint has it. */
export const booths = [
	{ id: 'light-table', label: 'Light table' },
	{ id: 'standard', label: 'Standard' },
	{ id: 'dark', label: 'Dark' },
] as const;
export type Booth = (typeof booths)[number]['id'];

export const boothCookie = 'merestone-booth';
export const boothCookieDays = 365;

/** The booth a cookie or form value names, or null where it names none (the system's wish decides). */
export const readBooth = (value: unknown): Booth | null =>
	booths.find((booth) => booth.id === value)?.id ?? null;
