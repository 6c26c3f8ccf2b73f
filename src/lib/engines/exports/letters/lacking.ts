import { isSetIn, type Drawing } from '../../sheet/index.ts';

/**
 * What is said of texts with letters that no face of the sheet has: in files that carry their letters
 * these show as an empty box or not at all. Empty where there are none.
 */
export function lackingLetters({ texts }: Pick<Drawing, 'texts'>): string[] {
	const lacking = [...new Set(texts.filter((one) => !isSetIn(one.face, one.text)).map(textOf))];
	if (!lacking.length) return [];
	const some = lacking.slice(0, 3).map((text) => `“${[...text].slice(0, 40).join('')}”`);
	const more = lacking.length > 3 ? ` and ${lacking.length - 3} more` : '';
	const [text, has] = lacking.length === 1 ? ['text', 'holds'] : ['texts', 'hold'];
	return [
		`${lacking.length} ${text} ${has} letters that the sheet’s typefaces lack: ${some.join(', ')}${more}.`,
	];
}

const textOf = ({ text }: { text: string }) => text;
