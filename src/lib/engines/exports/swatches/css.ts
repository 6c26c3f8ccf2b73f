import { cleanText } from '../../sheet/type/clean-text.ts';
import type { Ink } from '../../palettes/palette.ts';
import type { ExportAbout } from '../source.ts';
import { hatchWords } from '../tables/hatch-words.ts';

/**
 * The inks as custom properties of CSS (W3C, CSS Custom Properties for Cascading Variables Module Level
 * 1): `--ink-1`, `--ink-2`, ... by their numbers in the legend, and the same by name where the name has
 * Latin letters. What people typed stands in comments only, from which it cannot break out. Byte for byte
 * repeatable.
 */
export function exportCss(inks: readonly Ink[], about: ExportAbout): Uint8Array {
	const numbered = inks.map(({ name, hex, hatch }, ink) => {
		const words = `${cleanText(name)}${hatch ? `; ${hatchWords(hatch)}` : ''}`;
		return `\t--ink-${ink + 1}: ${hex};${words ? ` /* ${comment(words)} */` : ''}`;
	});
	const text = [
		'@charset "UTF-8";',
		`/* ${comment(cleanText(`${about.title}. ${about.issue}`))} */`,
		':root {',
		...numbered,
		...named(inks),
		'}',
		'',
	].join('\n');
	return new TextEncoder().encode(text);
}

/** A comment ends at the first asterisk with a slash after it (CSS Syntax Module Level 3, 4.3.2). */
const comment = (words: string): string => words.replace(/\*(?=\/)/g, '* ');

function named(inks: readonly Ink[]): string[] {
	const taken = new Set<string>();
	return inks.flatMap(({ name }, ink) => {
		const slug = name
			.normalize('NFKD')
			.replace(/\p{M}/gu, '')
			.toLowerCase()
			.replace(/[^a-z0-9]+/g, '-')
			.replace(/^-+|-+$/g, '')
			.slice(0, 60);
		if (!/^[a-z]/.test(slug) || taken.has(slug)) return [];
		taken.add(slug);
		return [`\t--ink-${slug}: var(--ink-${ink + 1});`];
	});
}
