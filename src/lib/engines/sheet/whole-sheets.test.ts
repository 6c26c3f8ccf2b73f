import Flatbush from 'flatbush';
import { describe, expect, it } from 'vitest';
import { topologyOf } from '../../../../tests/support/atlas.ts';
import { coverageFrom } from '../../../../tests/support/coverage.ts';
import { tavaroeSheet } from '../../../../tests/support/lettered-sheets.ts';
import {
	layout,
	sheetOf,
	statesCoverage,
	worldCoverage,
} from '../../../../tests/support/sheets.ts';
import { housePalettes } from '../palettes/index.ts';
import type { DrawnText, Drawing } from './drawing.ts';
import { ringPoints } from './fills.ts';
import { drawSheet, isSetIn, type SheetInput, type SheetLayout } from './index.ts';

type Parts = Partial<Omit<SheetLayout, 'frame' | 'collar'>> & {
	frame?: Partial<SheetLayout['frame']>;
	collar?: Partial<SheetLayout['collar']>;
};

const laid = ({ frame, collar, ...rest }: Parts): SheetLayout => ({
	...layout,
	...rest,
	frame: { ...layout.frame, ...frame },
	collar: { ...layout.collar, ...collar },
});
const sea = '#dfeaf2';
const eight = housePalettes[5].inks;
const graticule = { step: 'auto' as const, figures: true };
const all = coverageFrom(topologyOf('us-atlas', 'states-10m.json'), 'states', {
	keep: (_, id) => !['60', '66', '69', '78'].includes(id),
});

/** Greek and Cyrillic names from the Unicode locale data. */
function named(names: string[], language: string) {
	const english = new Intl.DisplayNames(['en'], { type: 'region', fallback: 'none' });
	const theirs = new Intl.DisplayNames([language], { type: 'region' });
	const letters = [...'ABCDEFGHIJKLMNOPQRSTUVWXYZ'];
	const codes = letters.flatMap((a) => letters.map((b) => a + b));
	const byName = new Map(codes.map((code) => [english.of(code), code]));
	const coverage = worldCoverage(names);
	const said = (name: string) => theirs.of(byName.get(name) ?? '') ?? name;
	return { ...coverage, names: coverage.names.map((one) => (byName.has(one) ? said(one) : one)) };
}

const balkans = ['Greece', 'Albania', 'Bulgaria', 'Romania', 'Serbia', 'Montenegro', 'Kosovo'];
const north = ['Russia', 'Ukraine', 'Belarus', 'Poland', 'Lithuania', 'Latvia', 'Estonia'];
const islands = ['Fiji', 'Tonga', 'Samoa', 'Vanuatu', 'New Caledonia', 'Solomon Is.'];
const far = ['Greenland', 'Iceland', 'Faeroe Is.', 'Norway'];

const sheets: [string, () => SheetInput | Promise<SheetInput>][] = [
	[
		'states with Alaska, Hawaii and Puerto Rico, framed',
		() =>
			sheetOf(all, {
				layout: laid({
					frame: { insets: 'auto', sea, neatLine: true, graticule, northArrow: true },
					collar: { legendAt: 'right', legendCounts: true },
					lettering: { ...layout.lettering, numbers: true },
				}),
			}),
	],
	[
		'the same, standing, counted at the foot',
		() =>
			sheetOf(all, {
				layout: laid({
					orientation: 'portrait',
					frame: { insets: 'auto' },
					collar: { legendCounts: true },
				}),
			}),
	],
	[
		'Greek names, legend on the map',
		() =>
			sheetOf(named(balkans, 'el'), {
				inks: eight,
				layout: laid({
					title: 'Τομείς πωλήσεων 2027',
					frame: { sea, neatLine: true, graticule },
					collar: { legendAt: 'corner', legendTitle: 'Τομείς' },
				}),
			}),
	],
	[
		'Cyrillic names, round half the globe',
		() =>
			sheetOf(named(north, 'ru'), {
				layout: laid({
					title: 'Сбытовые округа 2027',
					frame: { sea, neatLine: true, graticule, northArrow: true },
					collar: { legendAt: 'left', legendLines: true },
				}),
			}),
	],
	[
		'a chain of islands',
		() =>
			sheetOf(worldCoverage(islands), {
				layout: laid({ frame: { graticule, neatLine: true }, collar: { legendAt: 'corner' } }),
			}),
	],
	[
		'round a pole, with insets and the legend on the map',
		() =>
			sheetOf(worldCoverage(far), {
				layout: laid({
					orientation: 'portrait',
					frame: { sea, graticule, neatLine: true, insets: 'auto' },
					collar: { legendAt: 'corner' },
				}),
			}),
	],
	[
		'the world',
		() =>
			sheetOf(worldCoverage(), {
				layout: laid({ paper: 'A3', frame: { sea, graticule: { step: 30, figures: true } } }),
			}),
	],
	[
		'a long thin country',
		() =>
			sheetOf(worldCoverage(['Chile']), {
				layout: laid({ orientation: 'portrait', frame: { graticule, northArrow: true } }),
			}),
	],
	[
		'districts within provinces',
		async () => {
			const sheet = await tavaroeSheet();
			const { groupColumn } = sheet.layout;
			return { ...sheet, layout: laid({ groupColumn, frame: { sea, graticule } }) };
		},
	],
	[
		'eight inks on a small sheet',
		() =>
			sheetOf(statesCoverage(), {
				inks: eight,
				colouring: Int32Array.from({ length: 49 }, (_, i) => i % 8),
				layout: laid({ paper: 'A5', orientation: 'portrait', collar: { legendCounts: true } }),
			}),
	],
];

/** From the cap height to the descender of the shipped faces. */
const boxOf = ({ x, y, width, size }: DrawnText): [number, number, number, number] =>
	[...[x, y - 0.7 * size, x + width, y + 0.2 * size]] as [number, number, number, number];

function overlaps(texts: DrawnText[]): string[] {
	const index = new Flatbush(texts.length);
	for (const text of texts) index.add(...boxOf(text));
	index.finish();
	return texts.flatMap((text, i) =>
		index
			.search(...boxOf(text))
			.filter((j) => j > i)
			.map((j) => `${text.text} | ${texts[j].text}`),
	);
}

/** Whether a place lies on a region, even and odd over all rings of it. */
function isOn(drawing: Drawing, rings: Int32Array[], [x, y]: [number, number]): boolean {
	let inside = false;
	for (const ring of rings) {
		const p = ringPoints(drawing, ring);
		for (let i = 0, j = p.length - 2; i < p.length; j = i, i += 2) {
			const over = p[i + 1] > y !== p[j + 1] > y;
			if (over && x < ((p[j] - p[i]) * (y - p[i + 1])) / (p[j + 1] - p[i + 1]) + p[i])
				inside = !inside;
		}
	}
	return inside;
}

/** Words of the collar that lie on a region: their corners and their middle are looked at. */
function onRegions(drawing: Drawing): string[] {
	const others = drawing.texts.filter(({ layer }) => layer !== 'label');
	return others.flatMap((text) => {
		const [left, top, right, bottom] = boxOf(text);
		const places: [number, number][] = [
			[left, top],
			[right, top],
			[left, bottom],
			[right, bottom],
			[(left + right) / 2, (top + bottom) / 2],
		];
		const on = drawing.fills.find(({ rings }) =>
			places.some((place) => isOn(drawing, rings, place)),
		);
		return on ? `${text.text} on ${on.name}` : [];
	});
}

/** Names that are not in the same insets as the first ring of their region. */
function strayNames({ texts, shapes, ...drawing }: Drawing): string[] {
	const frames = shapes
		.filter(({ layer }) => layer === 'inset')
		.map(({ points }) => [points[0], points[1], points[4], points[5]]);
	const holds = ([l, t, r, b]: number[], x: number, y: number) => x > l && x < r && y > t && y < b;
	return texts.flatMap((text) => {
		if (text.layer !== 'label' || text.region === undefined) return [];
		const [left, top, right, bottom] = boxOf(text);
		const parts = drawing.fills[text.region].rings.map((ring) =>
			ringPoints(drawing as Drawing, ring),
		);
		const astray = frames.some((frame) => {
			const corners = [holds(frame, left, top), holds(frame, right, bottom)];
			const own = parts.map(([x, y]) => holds(frame, x, y));
			return corners[0] !== corners[1] || !own.includes(corners[0]);
		});
		return astray ? text.text : [];
	});
}

describe.each(sheets)('a sheet: %s', (_, make) => {
	it('has every text on the paper, whole, in letters of its face, and over no other', async () => {
		const drawing = drawSheet(await make());
		const { texts, widthMm, heightMm } = drawing;
		const off = texts.filter((text) => {
			const [left, top, right, bottom] = boxOf(text);
			return left < 0 || top < 0 || right > 100 * widthMm || bottom > 100 * heightMm;
		});
		expect(off).toEqual([]);
		expect(overlaps(texts)).toEqual([]);
		for (const { text, face } of texts) {
			expect(text).not.toContain('…');
			expect(isSetIn(face, text), text).toBe(true);
		}
	});

	it('has no words of the collar over regions, and names on their own side of insets', async () => {
		const drawing = drawSheet(await make());
		expect(onRegions(drawing)).toEqual([]);
		expect(strayNames(drawing)).toEqual([]);
	});
});
