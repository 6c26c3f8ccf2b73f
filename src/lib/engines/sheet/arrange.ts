import { collar, type Collar } from './collar/collar.ts';
import { emptyCorner } from './collar/empty-corner.ts';
import type { SheetInput } from './draw-sheet.ts';
import type { DrawnInk, LegendGround, LegendPlace } from './drawing.ts';
import type { SheetLayout } from './layout.ts';
import { figureRoom } from './graticule/figure-room.ts';
import { frameWidth } from './insets/inset-size.ts';
import { padded, placeOnPaper, type OnPaper } from './place-on-paper.ts';
import type { Box } from './plane/fit.ts';
import type { DrawnShape } from './shapes.ts';

/** The map on the paper and everything that stands around or on it, before names are set. */
export interface Arranged {
	placed: OnPaper;
	around: Collar;
	legend: LegendPlace | null;
	/** where no name may stand */
	obstacles: Box[];
	/** white grounds under text blocks */
	grounds: DrawnShape[];
	/** where the legend could not stand as asked, in a sentence; '' otherwise */
	legendNote: string;
}

const taken = 'The legend stands at the foot, because regions reach into every corner of the map.';

/**
 * Places the map within its collar. A legend that is wanted on the map goes to its emptiest corner; where
 * regions reach into all four, the sheet is arranged with the legend at its foot and says so.
 */
export function arrange(input: SheetInput, inks: DrawnInk[]): Arranged {
	const once = arrangeOnce(input, inks, input.layout);
	if (!once.around.floating || once.legend) return once;
	const { layout } = input;
	const atFoot = { ...layout, collar: { ...layout.collar, legendAt: 'foot' as const } };
	return { ...arrangeOnce(input, inks, atFoot), legendNote: taken };
}

function arrangeOnce(input: SheetInput, inks: DrawnInk[], layout: SheetLayout): Arranged {
	const { coverage, groups } = input;
	let around = null as Collar | null;
	const frameFor = (projection: string) => (around = collarOf(input, inks, layout, projection));
	const placed = placeOnPaper(coverage, layout, frameFor, groups);
	return { ...onTheMap(placed, around!, layout), placed, around: around!, legendNote: '' };
}

function collarOf(input: SheetInput, inks: DrawnInk[], layout: SheetLayout, projection: string) {
	const { coverage, weak, colouring, issue } = input;
	return collar({
		...{ layout, inks, projection, issue },
		coloured: colouring !== null,
		weak: new Set(weak.map(({ reader }) => reader)),
		regions: coverage.keys.length,
	});
}

/** The box that another layout would leave for the regions, about: figures are reckoned whole degrees. */
export function roomOn(input: SheetInput, inks: DrawnInk[], layout: SheetLayout): Box {
	const { map, scale } = collarOf(input, inks, layout, '');
	const within = layout.frame.graticule?.figures ? figureRoom(map, scale, true) : map;
	return padded(within, layout, scale);
}

/** Text blocks, and the legend where it is to stand on the map. */
function onTheMap(placed: OnPaper, around: Collar, { frame }: SheetLayout) {
	const { blocks, legend, floating, obstacles, scale } = around;
	const grounds = blocks.flatMap(({ ground }) => ground ?? []);
	if (!floating) return { legend, obstacles, grounds };
	const air = floating.size;
	const size = { width: floating.width + 2 * air, height: floating.height + 2 * air };
	const { arcs, sides, box, insets, globe } = placed;
	const corner = emptyCorner(arcs, sides, box, size, [
		...obstacles,
		...insets.map(({ outer }) => outer),
	]);
	if (!corner) return { legend: null, obstacles, grounds };
	const { x, y } = corner.box;
	// beside the globe the paper is bare
	const isEdged = !globe && Boolean(frame.sea || frame.graticule || frame.neatLine);
	const ground: LegendGround = {
		air,
		line: isEdged ? frameWidth(scale) : 0,
		right: x > box.x,
		bottom: y > box.y,
	};
	return {
		legend: { ...floating, x: x + air, y: y + air, ground },
		obstacles: [...obstacles, corner.box],
		grounds,
	};
}
