/** Letters that no page has to escape: the first half ends a number, the other half leads to its end. */
const letters = 'ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789-_';
const half = 32;

/**
 * Whole numbers from -1 as text, for pages: a letter each where they are below 31, as inks and classes are;
 * greater ones are written to the base 32, the greatest digit first.
 */
export function packNumbers(numbers: readonly number[]): string {
	return numbers.map(wordOf).join('');
}

function wordOf(number: number): string {
	let rest = number + 1;
	let word = letters[rest % half];
	for (rest = Math.floor(rest / half); rest > 0; rest = Math.floor(rest / half))
		word = letters[half + (rest % half)] + word;
	return word;
}

/** What `packNumbers` made. Throws RangeError for any other text. */
export function unpackNumbers(text: string): number[] {
	const numbers: number[] = [];
	let before = 0;
	for (let i = 0; i < text.length; i++) {
		const digit = digits[text.charCodeAt(i)] ?? none;
		if (digit === none) throw new RangeError('The numbers are spoilt.');
		if (digit === half && before === 0) throw new RangeError('The numbers are spoilt.');
		if (digit >= half) before = (before + digit - half) * half;
		else {
			numbers.push(before + digit - 1);
			before = 0;
		}
	}
	if (before) throw new RangeError('The numbers are cut off.');
	return numbers;
}

const none = 255;
const digits = new Uint8Array(128).fill(none);
for (let i = 0; i < letters.length; i++) digits[letters.charCodeAt(i)] = i;
