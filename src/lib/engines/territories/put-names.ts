/**
 * A message of the engine with names in place of its numbers: `#12` becomes `unit(12)` and `@3`
 * `territory(3)`. Names are put in as they are, whatever signs they hold.
 */
export const putNames = (
	message: string,
	unit: (number: number) => string,
	territory: (number: number) => string,
): string =>
	message.replace(/([#@])(\d+)/g, (_, sign: string, number: string) =>
		sign === '#' ? unit(Number(number)) : territory(Number(number)),
	);
