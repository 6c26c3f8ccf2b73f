import type { WorkbookPackage } from './package.ts';
import { parsePart } from './xml.ts';

/** The texts that cells point to, with their runs joined and readings of characters left out (18.4.8). */
export function readSharedStrings(pack: WorkbookPackage, part: string | null): string[] {
	const strings: string[] = [];
	if (part === null) return strings;
	const text = new RichText();
	parsePart(pack, part, {
		open: (name) => text.open(name),
		text: (value) => text.text(value),
		close(name) {
			text.close(name);
			if (name === 'si') strings.push(unescapeText(text.take()));
		},
	});
	return strings;
}

/** Gathers the text of `t` elements, but not within a phonetic run (`rPh`). */
export class RichText {
	private gathered = '';
	private inText = false;
	private inReading = false;

	open(name: string): void {
		if (name === 'rPh') this.inReading = true;
		else if (name === 't') this.inText = !this.inReading;
	}

	text(value: string): void {
		if (this.inText) this.gathered += value;
	}

	close(name: string): void {
		if (name === 'rPh') this.inReading = false;
		else if (name === 't') this.inText = false;
	}

	take(): string {
		const text = this.gathered;
		this.gathered = '';
		return text;
	}
}

/** `_x000D_` stands for a character that XML cannot hold (ECMA-376 part 1, 22.9.2.19, ST_Xstring). */
export const unescapeText = (text: string): string =>
	text.includes('_x')
		? text.replace(/_x([0-9a-fA-F]{4})_/g, (_, hex) => String.fromCharCode(parseInt(hex, 16)))
		: text;
