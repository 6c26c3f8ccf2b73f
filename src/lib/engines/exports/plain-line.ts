/** A JSON string of one line, line ends of every script written as escapes. */
export const plainLine = (name: string): string =>
	JSON.stringify(name).replace(
		/[\u007f-\u009f\u2028\u2029]/g,
		(sign) => `\\u${sign.charCodeAt(0).toString(16).padStart(4, '0')}`,
	);
