/** What exporters are given, for tests: a sheet of the states unless another is asked for. */
import { readFileSync } from 'node:fs';
import type { ExportSource, FaceFiles } from '../../src/lib/engines/exports/index.ts';
import {
	drawSheet,
	faceStyles,
	sheetTable,
	type Face,
	type SheetInput,
} from '../../src/lib/engines/sheet/index.ts';
import type { Hatch } from '../../src/lib/engines/palettes/palette.ts';
import { inks, sheetOf, statesCoverage } from './sheets.ts';

export const fonts: FaceFiles = Object.fromEntries(
	(Object.keys(faceStyles) as Face[]).map((face) => [
		face,
		new Uint8Array(readFileSync(`static/fonts/${face}.ttf`)),
	]),
);

const hatch: Hatch = { kind: 'lines', angle: 30, spacingMm: 1.5, widthMm: 0.2, hex: '#333333' };

/** The everyday inks, the first crossed and the third hatched. */
export const hatchedInks = inks.map((ink, number) => {
	if (number === 0) return { ...ink, hatch: { ...hatch, kind: 'crossed' as const, angle: 45 } };
	return number === 2 ? { ...ink, hatch } : ink;
});

export function sourceOf(
	coverage = statesCoverage(),
	changes: Partial<SheetInput> = {},
	more: Partial<ExportSource> = {},
): ExportSource {
	const sheet = sheetOf(coverage, changes);
	const drawing = drawSheet(sheet);
	const rules = { pointTouches: false, leastMetres: 0, waterKm: null, struck: [], added: [] };
	const { keys, names } = coverage;
	return {
		...{ drawing, coverage, fonts, columns: [] },
		rows: sheetTable(drawing, coverage, sheet.groups),
		borders: { title: sheet.layout.title, keys, names, borders: sheet.borders, rules },
		about: {
			...{ title: sheet.layout.title, issue: 'Edition 4, 1 December 2026' },
			...{ date: '2026-12-01T10:00:00Z', author: 'Corran Pumps', digest: 'ab'.repeat(32) },
			...{ credits: sheet.layout.credits, stem: 'corran-edition-4', language: 'en' },
		},
		...more,
	};
}

/** Names that try to break out of every form that carries them. */
export const hostileNames = [
	'<script>alert(1)</script>',
	'"><img src=x onerror=alert(1)>',
	"' onload='alert(1)",
	'a\u0000b\u0007c\u001b[31m\ufffe',
	'\ud800 lone',
	'\u202egpj.exe',
	']]>&amp;<!-- */ } body { display: none } /*',
	'=HYPERLINK("http://evil.example")',
	'+1-2@SUM(A1)',
	'__proto__',
	'{$alias.of.token}',
	'\\) Tj ET (',
	'ж'.repeat(3000),
	'',
];

export function hostileSource(): ExportSource {
	const coverage = statesCoverage();
	const of = (i: number) => hostileNames[i % hostileNames.length];
	coverage.names = coverage.names.map((_, i) => of(i));
	coverage.keys = coverage.keys.map((key, i) => `${key} ${of(i)}`);
	const source = sourceOf(coverage, {
		inks: hatchedInks.map((ink, i) => ({ ...ink, name: of(i) })),
	});
	const { about } = source;
	return {
		...source,
		about: { ...about, title: of(6), author: of(0), issue: of(11), credits: of(7) },
	};
}
