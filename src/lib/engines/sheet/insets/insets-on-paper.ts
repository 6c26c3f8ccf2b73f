/**
 * The insets of a sheet: a projection of its own for each, a box where there is room, its arcs on the
 * paper. Where the map leaves no room, a strip of its box is kept free for them and the map grows smaller.
 */
import type { Coverage } from '../../boundaries/coverage.ts';
import { drawnRings } from '../fills.ts';
import type { SheetLayout } from '../layout.ts';
import { partsOnly, withArcs, type LonLatArcs } from '../plane/arc-subsets.ts';
import { chooseProjection, type ProjectionChoice } from '../plane/choose-projection.ts';
import { extentOf } from '../plane/extent.ts';
import { planeBoxOf, ratioOf, type MapFit } from '../plane/fit-map.ts';
import { fitInto, type Box, type Fit } from '../plane/fit.ts';
import { projectArcs } from '../plane/project-arcs.ts';
import { quantise, type SheetArcs } from '../plane/quantise.ts';
import { slackOf } from '../plane/slack.ts';
import { insetNames } from './cluster-name.ts';
import { freeGrid } from './free-grid.ts';
import { insetDress, type InsetHead } from './inset-size.ts';
import { bestOfAll, isSame } from './place-cost.ts';
import { placeInsets, type InsetSpot, type InsetWish } from './place-insets.ts';
import type { SharedOut } from './share-out.ts';

export interface PlacedInset {
	id: string;
	name: string;
	/** its frame, and where its regions stand in it */
	outer: Box;
	inner: Box;
	/** words over it; whether a bar stands under it */
	head: InsetHead;
	bar: boolean;
	/** 1 : n at its middle, and whether the map has the same */
	ratio: number;
	sameScale: boolean;
	chosen: ProjectionChoice;
	fit: Fit;
	slack: number;
}

/** The map as far as it is known before the insets have their places. */
export interface MapOnPaper {
	box: Box;
	/** type scale of the sheet */
	scale: number;
	chosen: ProjectionChoice;
	fitIn: (box: Box) => MapFit;
	arcsAt: (fit: Fit) => SheetArcs;
	rings: Int32Array[][];
	/** where something of the collar stands on the box */
	obstacles: readonly Box[];
}

export interface InsetsOnPaper {
	map: MapFit;
	/** all arcs of the sheet */
	arcs: SheetArcs;
	insets: PlacedInset[];
	told: string[];
}

/** Shares of the box that are kept free for insets, tried in turn. */
const strips = [0.12, 0.2, 0.28, 0.38, 0.5];
/** What the map's growing smaller costs, against the costs of `placeInsets`; and an inset without room. */
const lossWeight = 12;
const noRoom = 20;
/** What another side than the one that costs least may cost more, to lie nearer to the true direction. */
const sideWorth = 0.2;

/** In: groups that get a box, and the arcs of each. */
export function insetsOnPaper(
	coverage: Coverage,
	layout: SheetLayout,
	groups: (string | null)[],
	boxed: { cluster: SharedOut; arcs: Uint32Array; lines: LonLatArcs }[],
	map: MapOnPaper,
): InsetsOnPaper {
	if (!boxed.length) {
		const fitted = map.fitIn(map.box);
		return { map: fitted, arcs: map.arcsAt(fitted.fit), insets: [], told: [] };
	}
	const names = insetNames(
		coverage,
		groups,
		boxed.map(({ cluster }) => cluster),
		layout.frame.insetChoices,
	);
	const drafts = boxed.map(({ cluster, lines }, i) =>
		draftOf(coverage, layout, names[i], cluster, lines, map.chosen),
	);
	const dress = insetDress(map.scale, layout.scaleBar);
	let best: { cost: number; settle: () => InsetsOnPaper } | null = null;
	for (const { fitted, loss } of freedRooms(map)) {
		// what costs more than all that it could gain
		if (best && loss - bestOfAll * drafts.length >= best.cost) break;
		const arcs = map.arcsAt(fitted.fit);
		const grid = freeGrid(arcs, drawnRings(map.rings, arcs), map.box);
		const ground = { grid, dress, mapRatio: fitted.ratio ?? 1, scale: map.scale };
		const spots = placeInsets(
			drafts.map((draft) => draft.wish(fitted.fit, map.box)),
			{ ...ground, obstacles: map.obstacles },
		);
		const cost = spots.reduce((sum, spot) => sum + (spot ? spot.cost : noRoom), loss);
		if (best && best.cost <= cost) continue;
		best = { cost, settle: () => settled(boxed, drafts, spots, fitted, arcs) };
	}
	return best!.settle();
}

/**
 * The map fitted beside a strip that is kept free along one side of its box, or beside none; what that costs in
 * scale, the least first. Where the box is longer than the map, a strip costs nothing and only moves it.
 */
function freedRooms({ box, fitIn }: MapOnPaper): { fitted: MapFit; loss: number }[] {
	const whole = fitIn(box);
	const rooms = strips.flatMap((strip) => {
		const beside = sidesLess(box, strip).map((room) => {
			const fitted = fitIn(room);
			return { fitted, loss: lossWeight * (1 - fitted.fit.scale / whole.fit.scale) };
		});
		const least = Math.min(...beside.map(({ loss }) => loss));
		return beside.filter(({ loss }) => loss <= least + sideWorth);
	});
	const all = [{ fitted: whole, loss: 0 }, ...rooms];
	return all.sort((a, b) => a.loss - b.loss);
}

/** The box less a share of it left, below, above and right. */
function sidesLess(box: Box, share: number): Box[] {
	const [across, down] = [Math.round(box.width * share), Math.round(box.height * share)];
	const [narrow, low] = [
		{ ...box, width: box.width - across },
		{ ...box, height: box.height - down },
	];
	return [{ ...narrow, x: box.x + across }, low, { ...low, y: box.y + down }, narrow];
}

type Draft = ReturnType<typeof draftOf>;

function draftOf(
	coverage: Coverage,
	layout: SheetLayout,
	name: string,
	cluster: SharedOut,
	lines: LonLatArcs,
	mapProjection: ProjectionChoice,
) {
	const extent = extentOf(partsOnly(coverage, cluster.parts));
	const chosen = chooseProjection(extent, { projection: 'auto' });
	const slack = slackOf(extent);
	const plane = projectArcs(lines, chosen.projection, slack);
	const bounds = planeBoxOf(plane);
	// measured at a size at which hundredths of a millimetre are small against the whole
	const measured = fitInto(corners(bounds), { x: 0, y: 0, width: 1e5, height: 1e5 });
	const ratio = ratioOf(chosen.projection, bounds, measured) ?? 1;
	const atOne = measured.scale * ratio;
	const choice = layout.frame.insetChoices[cluster.id];
	const wish = (fit: Fit, box: Box): InsetWish => ({
		name,
		width: atOne * (bounds.right - bounds.left),
		height: atOne * (bounds.bottom - bounds.top),
		towards: direction(extent, mapProjection, fit, box),
		ratio: choice?.ratio ?? null,
		cornerMm: choice?.cornerMm ?? null,
	});
	return { id: cluster.id, name, chosen, slack, plane, bounds, wish };
}

const corners = ({ left, right, top, bottom }: ReturnType<typeof planeBoxOf>) => ({
	points: Float64Array.of(left, top, right, bottom),
	starts: Uint32Array.of(0, 2),
});

/** From the middle of the map's box towards where the group would lie on the map. */
function direction(
	{ west, east, south, north }: ReturnType<typeof extentOf>,
	{ projection }: ProjectionChoice,
	{ scale, dx, dy }: Fit,
	box: Box,
): [number, number] {
	const [x, y] = projection([(west + east) / 2, (south + north) / 2]) ?? [NaN, NaN];
	const [right, down] = [
		x * scale + dx - box.x - box.width / 2,
		y * scale + dy - box.y - box.height / 2,
	];
	const away = Math.hypot(right, down);
	return away > 0 && Number.isFinite(away) ? [right / away, down / away] : [0, 0];
}

function settled(
	boxed: { arcs: Uint32Array }[],
	drafts: Draft[],
	spots: (InsetSpot | null)[],
	map: MapFit,
	arcs: SheetArcs,
): InsetsOnPaper {
	const told: string[] = [];
	const patches: { arcs: Uint32Array; points: SheetArcs }[] = [];
	const insets: PlacedInset[] = [];
	spots.forEach((spot, i) => {
		const { id, name, chosen, slack, plane, bounds } = drafts[i];
		if (!spot) {
			told.push(
				`There is no room for a box for ${name}, so it is not on the sheet. Take a larger paper, or put it into the map's frame.`,
			);
			return insets.push(lost(drafts[i]));
		}
		told.push(...spot.told);
		const fit = fitInto(corners(bounds), spot.inner);
		patches.push({ arcs: boxed[i].arcs, points: quantise(plane, fit) });
		const { outer, inner, head, bar, ratio } = spot;
		const sameScale = map.ratio !== null && isSame(ratio, map.ratio);
		const set = { outer, inner, head, bar, ratio, sameScale };
		insets.push({ ...{ id, name, chosen, fit, slack }, ...set });
	});
	return { map, arcs: patches.length ? withArcs(arcs, patches) : arcs, insets, told };
}

/** An inset without a box keeps its number, and nothing of it is drawn. */
function lost({ id, name, chosen, slack }: Draft): PlacedInset {
	const nowhere = { x: 0, y: 0, width: 0, height: 0 };
	const fit = { scale: 0, dx: 0, dy: 0 };
	return {
		...{ id, name, chosen, slack, fit },
		outer: nowhere,
		inner: nowhere,
		...{ head: { name: [], scale: '' }, bar: false },
		ratio: 0,
		sameScale: false,
	};
}
