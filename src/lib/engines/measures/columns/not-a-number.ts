import type { NotNumberKind } from './typed-column.ts';

/** Common practice of tables of figures, no source. */
const placeholders = new Set(
	[
		'-',
		'–',
		'—',
		'−',
		'--',
		'.',
		'..',
		'...',
		'…',
		'?',
		'/',
		'x',
		'na',
		'n/a',
		'n.a.',
		'n. a.',
		'#n/a',
	].concat(['k.a.', 'k. a.', 'null', 'none', 'nil', 'missing']),
);

/** Error values of spreadsheets: ECMA-376 part 1, 18.17.2 (`error-constant`), and later ones alike. */
const error = /^#[A-Z][A-Z0-9/_]*[!?]?$/i;
const notFinite = /^[-+−]?(inf|infinity|∞|nan|-?1\.#(inf|ind|qnan))$/i;

/** What a text is that is no number. */
export function notNumberKind(text: string): NotNumberKind {
	const plain = text.trim();
	if (placeholders.has(plain.toLowerCase())) return 'placeholder';
	if (notFinite.test(plain)) return 'not-finite';
	return error.test(plain) ? 'error' : 'text';
}
