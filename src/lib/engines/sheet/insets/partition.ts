import type { Coverage } from '../../boundaries/coverage.ts';
import type { SheetLayout } from '../layout.ts';
import type { Drawable } from '../plane/drawable.ts';
import type { Box } from '../plane/fit.ts';
import { cleanText } from '../type/clean-text.ts';
import { clusterName, whereabouts } from './cluster-name.ts';
import { clustersOf } from './clusters.ts';
import { shareOut, type SharedOut } from './share-out.ts';

/** In `arcFrame`: the arc is not on the sheet. */
export const notDrawn = 255;
/** Frames are counted in a byte. */
const mostFrames = 254;

/** Which parts of a coverage are drawn in which frame of the sheet. */
export interface Partition {
	clusters: SharedOut[];
	/** groups that have a box, in order: the first is in frame 1 */
	boxed: SharedOut[];
	/** parts in the map's own frame; null: all */
	own: number[] | null;
	/** frame of each arc of the coverage: 0 the map's own, from 1 an inset's, `notDrawn`; null: all 0 */
	arcFrame: Uint8Array | null;
}

/** In: `box`, about where the map will lie, to tell what the frame costs in scale. */
export function partition(coverage: Coverage, layout: SheetLayout, box: Box): Partition {
	const none = { clusters: [], boxed: [], own: null, arcFrame: null };
	if (layout.frame.insets === 'none' || coverage.keys.length === 0) return none;
	const clusters = shareOut(coverage, clustersOf(coverage), layout, box);
	if (clusters.every(({ place }) => place === 'frame')) return { ...none, clusters };
	const boxed = clusters.filter(({ place }) => place === 'box').slice(0, mostFrames);
	const arcFrame = new Uint8Array(coverage.arcStarts.length - 1).fill(notDrawn);
	const own = clusters.filter(({ place }) => place === 'frame').flatMap(({ parts }) => parts);
	putArcs(coverage, own, arcFrame, 0);
	boxed.forEach(({ parts }, i) => putArcs(coverage, parts, arcFrame, i + 1));
	return { clusters, boxed, own, arcFrame };
}

function putArcs(coverage: Coverage, parts: number[], arcFrame: Uint8Array, frame: number): void {
	const { partRings, ringStarts, ringArcs } = coverage;
	for (const part of parts) {
		const end = ringStarts[partRings[part + 1]];
		for (let i = ringStarts[partRings[part]]; i < end; i++)
			arcFrame[ringArcs[i] < 0 ? ~ringArcs[i] : ringArcs[i]] = frame;
	}
}

/** The frames of all arcs that are drawn, with those that were added for the cut of the map. */
export function withAdded(arcFrame: Uint8Array, { addedFor }: Drawable): Uint8Array {
	return Uint8Array.from([...arcFrame, ...addedFor.map((arc) => arcFrame[arc])]);
}

export function arcsOfFrame(arcFrame: Uint8Array, frame: number): Uint32Array {
	const arcs: number[] = [];
	arcFrame.forEach((own, arc) => {
		if (own === frame) arcs.push(arc);
	});
	return Uint32Array.from(arcs);
}

/** What the sheet says of parts that are not on it; '' where all are. */
export function missingWords(
	coverage: Coverage,
	groups: (string | null)[],
	{ clusters }: Partition,
): string {
	const out = clusters.filter(({ place }) => place === 'out');
	const names = new Set(
		out.map((one) => cleanText(`${clusterName(coverage, groups, one)}${whereabouts(one)}`)),
	);
	return names.size ? `Not on this sheet: ${[...names].join(', ')}.` : '';
}
