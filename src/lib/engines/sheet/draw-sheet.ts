/**
 * Coverage to drawing: place the regions on the paper, fill them, draw every border once, letter the
 * map, set the collar. The same input gives the same drawing on every machine.
 */
import { asSeenBy as seen, labelInk } from '../colour/index.ts';
import type { BorderList } from '../borders/border-list.ts';
import type { Coverage } from '../boundaries/coverage.ts';
import type { Ink, Reader, WeakBorder } from '../palettes/palette.ts';
import { arrange, roomOn } from './arrange.ts';
import { drawLegend } from './collar/legend.ts';
import { describe } from './describe.ts';
import type { DrawnInk, DrawnText, Drawing, RegionFill } from './drawing.ts';
import { hatchShapes } from './hatch/hatch-shapes.ts';
import { labelSheet, unlettered } from './labels/label-sheet.ts';
import type { SheetLayout } from './layout.ts';
import { leaderLayer, withLeaders } from './leader-lines.ts';
import { lineLayers } from './lines.ts';
import { paperBox, paperSize } from './paper.ts';
import type { Placement } from './place-on-paper.ts';
import { drawFrame } from './frame/draw-frame.ts';
import { frameObstacles } from './frame/obstacles.ts';
import { drawScale } from './collar/draw-scale.ts';
import { smallerSide } from './smaller-side.ts';
import { legendInks, themedInput, type SheetTheme } from './themed.ts';
import { cleanText } from './type/clean-text.ts';

export interface SheetInput {
	coverage: Coverage;
	borders: BorderList;
	/** what the column of names says of every region, where names are taken from one */
	named?: (string | null)[] | null;
	/** the level above, one a region: a province's name, or null */
	groups: (string | null)[];
	/** ink number from 0 for every region; null while nothing is coloured */
	colouring: Int32Array | null;
	inks: Ink[];
	layout: SheetLayout;
	reader: Reader;
	weak: WeakBorder[];
	/** 1 for a locked region */
	locked?: Uint8Array;
	/** what is issued and when, in words: `Edition 4, 1 December 2026` */
	issue: string;
	/** the classes of a measure, shown in place of the colouring and its inks */
	theme?: SheetTheme | null;
	/** leaves hatches out, where a painter cuts them itself tile by tile */
	bare?: boolean;
	/** how a reader sees a colour; that of the colour engine unless given */
	asSeenBy?: (hex: string, reader: Reader) => string;
}

/** Regions without an ink: a neutral that no palette is made of. */
export const uncoloured = '#f2f2f2';

/** Half the regions smaller than this, in hundredths of a millimetre: borders are drawn finer. */
const fineBelow = 450;

export function fillHex(ink: number, inks: DrawnInk[]): string {
	return inks[ink]?.shown ?? uncoloured;
}

/** Ink numbers in use, ascending. */
export function inksInUse(fills: { ink: number }[]): number[] {
	return [...new Set(fills.map(({ ink }) => ink))].filter((ink) => ink >= 0).sort((a, b) => a - b);
}

/**
 * Draws a sheet.
 *
 * In: see `SheetInput`; arrays are in region order, names may hold anything. Out: a drawing in whole
 * hundredths of a millimetre in which every region has one fill, every border is drawn once, no two
 * labels overlap, all text stands on the paper, and the caution is whole. Throws RangeError for an
 * impossible paper size or a colouring that names an ink the palette has not.
 */
export const drawSheet = (input: SheetInput): Drawing => drawPlaced(input).drawing;

/** Draws a sheet, and tells where the ground came to lie on it, so that finer lines can be laid in. */
export function drawPlaced(asked: SheetInput): { drawing: Drawing; placement: Placement } {
	const input = themedInput(asked);
	const { coverage, layout, reader, weak, groups } = input;
	const see = input.asSeenBy ?? seen;
	const seenNow = (hex: string) => see(hex, reader);
	const inks = input.inks.map((ink) => ({ ...ink, shown: seenNow(ink.hex) }));
	const { placed, around, legend, obstacles, grounds, legendNote } = arrange(input, inks);
	const { texts, bar, scale, blocks } = around;
	const fills = fillRegions(input, inks, placed.rings);
	const names = coverage.names.map(cleanText);
	const { arcs, rings, sides } = placed;
	const labels = layout.labels
		? labelSheet({
				...{ arcs, rings, sides, groups, scale, names: lettered(input) },
				...{ keys: coverage.keys, areas: coverage.areasKm2, lettering: layout.lettering },
				...{ box: placed.box, paper: paperBox(layout) },
				obstacles: [...obstacles, ...frameObstacles(placed, scale)],
				frames: placed.insets.filter(({ ratio }) => ratio > 0).map(({ outer }) => outer),
			})
		: unlettered(names.length);
	const small = rings.map((list) => smallerSide(arcs, list)).sort((a, b) => a - b);
	const fine = (small[Math.floor(small.length / 2)] ?? 0) < fineBelow;
	const lines = [
		...lineLayers({
			...{ sides, arcs, borders: input.borders, groups, weak, scale, fine },
			look: layout.lines,
			see: seenNow,
		}),
		...leaderLayer(arcs, labels.leaders, scale),
	];
	const { themed } = input;
	const keys = drawLegend(
		legend,
		{ inks, fills, lines, themed },
		legendInks(fills, themed),
		seenNow,
	);
	const measured = drawScale(placed, bar);
	const frame = drawFrame({
		...{ coverage, groups, layout, placed, scale, reader, see, obstacles },
		labels: labels.texts,
		roomOn: (other) => roomOn(input, inks, other),
	});
	const drawing: Drawing = {
		...paperSize(layout),
		title: cleanText(layout.title),
		description: '',
		reader,
		inks,
		...withLeaders(arcs, labels.leaders),
		fills,
		lines,
		shapes: [
			...(input.bare ? [] : hatchShapes({ ...arcs, fills, inks }, seenNow)),
			...frame.shapes,
			...grounds,
			...keys.shapes,
		],
		texts: [
			...inkLabels(labels.texts, fills, inks),
			...texts,
			...measured.texts,
			...frame.texts,
			...keys.texts,
			...blocks.flatMap((block) => block.texts),
		],
		rects: [...measured.rects, ...frame.rects, ...keys.rects],
		unplaced: labels.unplaced,
		lettering: labels.lettering,
		notes: {
			projection: placed.chosen.sentence,
			scale: measured.sentence,
			insets: frame.sentence,
			legend: legendNote,
		},
		frame: frame.report,
		legend,
		...(themed && { themed }),
	};
	return { drawing: { ...drawing, description: describe(drawing) }, placement: placed };
}

/** The names to be set: as a column has them, where it has one, composed as fonts hold letters. */
const lettered = ({ coverage, named }: SheetInput): string[] =>
	coverage.names.map((name, region) => cleanText(named?.[region] ?? name).normalize('NFC'));

function fillRegions(input: SheetInput, inks: DrawnInk[], rings: Int32Array[][]): RegionFill[] {
	const { coverage, colouring, locked } = input;
	return coverage.keys.map((key, region) => {
		const ink = colouring ? colouring[region] : -1;
		if (ink >= inks.length) throw new RangeError(`ink ${ink} of ${inks.length}`);
		return {
			region,
			key,
			name: cleanText(coverage.names[region]),
			ink,
			hex: fillHex(ink, inks),
			...(locked?.[region] ? { locked: true } : {}),
			rings: rings[region],
		};
	});
}

/**
 * Black or white for every label that stands on a fill, whichever reads better. One that goes over
 * the border, or stands on a hatched fill, keeps its fill around its letters.
 */
export function inkLabels(texts: DrawnText[], fills: RegionFill[], inks: DrawnInk[]): DrawnText[] {
	return texts.map((text) => {
		if (!text.onFill || text.region === undefined) return text;
		const { hex, ink } = fills[text.region];
		const { halo, clears, ...bare } = text;
		const own = clears ? undefined : halo;
		if (inks[ink]?.hatch && !own) return { ...bare, hex: labelInk(hex), halo: hex, clears: true };
		return { ...bare, hex: labelInk(hex), ...(own ? { halo: hex } : {}) };
	});
}
