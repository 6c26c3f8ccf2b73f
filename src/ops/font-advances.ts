/**
 * Writes the glyph advances of the five faces a sheet is set in, and copies the faces themselves
 * with their licences to static/fonts. Run after the font packages change:
 * `npx tsx src/ops/font-advances.ts`. The same fonts give the same files.
 */
import { copyFileSync, mkdirSync, writeFileSync } from 'node:fs';
import { openSync, type Font } from 'fontkit';

const packages = 'node_modules/@expo-google-fonts';
const sans = `${packages}/sofia-sans-semi-condensed`;
const serif = `${packages}/source-serif-4`;
const faces = [
	['sans', `${sans}/400Regular/SofiaSansSemiCondensed_400Regular.ttf`],
	['sans-bold', `${sans}/700Bold/SofiaSansSemiCondensed_700Bold.ttf`],
	['serif', `${serif}/400Regular/SourceSerif4_400Regular.ttf`],
	['serif-bold', `${serif}/700Bold/SourceSerif4_700Bold.ttf`],
	['serif-italic', `${serif}/400Regular_Italic/SourceSerif4_400Regular_Italic.ttf`],
] as const;

/** Latin and its extensions, Greek, Cyrillic, punctuation, signs. */
const blocks = [
	[0x20, 0x7e],
	[0xa0, 0x24f],
	[0x2b0, 0x2ff],
	[0x370, 0x52f],
	[0x1e00, 0x1eff],
	[0x2000, 0x22ff],
] as const;

/** Runs of code points that the face has, as [first, advance, advance, ...]. */
function runs(font: Font): number[][] {
	const found: number[][] = [];
	let open: number[] | null = null;
	for (const [first, last] of blocks) {
		for (let code = first; code <= last; code++) {
			if (!font.hasGlyphForCodePoint(code)) open = null;
			else {
				if (!open) found.push((open = [code]));
				open.push(font.glyphForCodePoint(code).advanceWidth);
			}
		}
		open = null;
	}
	return found;
}

mkdirSync('static/fonts', { recursive: true });
copyFileSync(`${sans}/LICENSE_FONT`, 'static/fonts/OFL-sofia-sans-semi-condensed.txt');
copyFileSync(`${serif}/LICENSE_FONT`, 'static/fonts/OFL-source-serif-4.txt');
for (const [face, file] of faces) {
	const font = openSync(file) as Font;
	copyFileSync(file, `static/fonts/${face}.ttf`);
	const lines = runs(font).map((run) => `\t'${run.map((n) => n.toString(36)).join(' ')}',`);
	writeFileSync(
		`src/lib/engines/sheet/type/${face}.ts`,
		[
			`/**`,
			` * ${font.fullName}: made by src/ops/font-advances.ts, never by hand. Runs of neighbouring code`,
			` * points in base 36: the first code point, then the advance of each, in thousandths of the size.`,
			` */`,
			`export const runs = [`,
			...lines,
			`];`,
			'',
		].join('\n'),
	);
	if (font.unitsPerEm !== 1000) throw new Error(`${face}: ${font.unitsPerEm} units an em`);
}
