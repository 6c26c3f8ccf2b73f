import { cleanText } from '../../sheet/type/clean-text.ts';
import type { Ink } from '../../palettes/palette.ts';
import type { ExportAbout } from '../source.ts';
import { hatchWords } from '../tables/hatch-words.ts';

/**
 * The inks as Design Tokens. Source: Design Tokens Format Module and Color Module 2025.10, Design Tokens
 * Community Group: one group, `inks`, of type `color`; each value in the colour space `srgb` with its
 * components from 0 to 1 and the hex digits beside them; the ink's name and hatch in its description,
 * the hatch also as an extension. Byte for byte repeatable.
 */
export function exportTokens(inks: readonly Ink[], about: ExportAbout): Uint8Array {
	const names = tokenNames(inks);
	const tokens = inks.map((ink, i) => [names[i], tokenOf(ink, i)] as const);
	const document = {
		$description: cleanText(`${about.title}. ${about.issue}`),
		inks: { $type: 'color', ...Object.fromEntries(tokens) },
	};
	return new TextEncoder().encode(`${JSON.stringify(document, null, '\t')}\n`);
}

function tokenOf({ name, hex, hatch }: Ink, ink: number) {
	const said = cleanText(name) || 'without a name';
	const words = `Ink ${ink + 1}: ${said}${hatch ? `; ${hatchWords(hatch)}` : ''}`;
	return {
		$description: words,
		$value: { colorSpace: 'srgb', components: components(hex), alpha: 1, hex },
		...(hatch ? { $extensions: { 'merestone.hatch': hatch } } : {}),
	};
}

/** Five decimals: every one of 256 steps comes back as it was. */
const components = (hex: string): number[] =>
	[1, 3, 5].map((at) => Math.round((parseInt(hex.slice(at, at + 2), 16) / 255) * 1e5) / 1e5);

/**
 * Names as the Format Module allows them (5.1.1): no leading `$`, none of `{`, `}` and `.`; never empty,
 * never twice, and none that programs mistake for their own. A name of digits alone would change the order.
 */
function tokenNames(inks: readonly Ink[]): string[] {
	const taken = new Set(['__proto__', 'constructor', 'prototype']);
	return inks.map(({ name }, ink) => {
		const clean = cleanText(name)
			.replace(/[{}.]/g, ' ')
			.replace(/^[$\s]+/, '')
			.replace(/\s+/g, ' ');
		const short = [...clean].slice(0, 80).join('').trim();
		const fit =
			short && !/^\d+$/.test(short) && !taken.has(short) ? short : `Ink ${ink + 1} ${short}`;
		let unique = fit.trim();
		for (let more = 2; taken.has(unique); more++) unique = `${fit.trim()} ${more}`;
		taken.add(unique);
		return unique;
	});
}
