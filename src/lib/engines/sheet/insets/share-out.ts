/**
 * Which groups of parts share the map's own frame, which are set into boxes, and which are left out. A
 * group joins the frame if that costs little scale; the rest go into boxes. Specks that belong to a region
 * drawn elsewhere are left out until the user decides; a region is never left out unasked.
 */
import type { Coverage } from '../../boundaries/coverage.ts';
import type { FrameLayout } from '../layout/frame.ts';
import type { SheetLayout } from '../layout.ts';
import { partsOnly } from '../plane/arc-subsets.ts';
import { chooseProjection } from '../plane/choose-projection.ts';
import { extentOf } from '../plane/extent.ts';
import type { Box } from '../plane/fit.ts';
import type { Cluster } from './clusters.ts';

export type ClusterPlace = 'frame' | 'box' | 'out';

export interface SharedOut extends Cluster {
	place: ClusterPlace;
	/** as it would be if nobody had decided */
	suits: ClusterPlace;
	/** too small to be seen at the scale of the map */
	speck: boolean;
}

/** A group may take this much of the scale by itself, and all together this much. */
const costs = { one: 0.9, all: 0.8 };
/** A group as large as this share of the largest always stays in the frame. */
const alwaysIn = 1 / 3;
/** Smaller on the map than this, in hundredths of a millimetre, or than this share of the largest group. */
const specks = { side: 220, share: 1 / 1000 };
/** Most boxes made unasked, and most groups that are tried for the frame. */
const mostBoxes = 6;
const mostTried = 40;
/** Above this the map goes round the globe, and everything is in its frame. */
const worldSpan = 180;

export function shareOut(
	coverage: Coverage,
	clusters: Cluster[],
	layout: Pick<SheetLayout, 'projection'> & { frame: FrameLayout },
	box: Box,
): SharedOut[] {
	const large = clusters.filter(({ areaKm2 }) => areaKm2 >= clusters[0].areaKm2 * alwaysIn);
	const partsOf = (list: Cluster[]) => list.flatMap(({ parts }) => parts);
	const extent = extentOf(partsOnly(coverage, partsOf(large)));
	const inFrame = [...large];
	const measure = frameScale(coverage, layout, box);
	const first = measure(partsOf(large));
	let scale = first;
	const world = extent.east - extent.west > worldSpan;
	clusters.slice(0, mostTried).forEach((cluster) => {
		if (large.includes(cluster) || world) return;
		const joint = measure(partsOf([...inFrame, cluster]));
		if (joint < scale * costs.one || joint < first * costs.all) return;
		inFrame.push(cluster);
		scale = joint;
	});
	const whole = wholeRegions(coverage, clusters);
	let boxes = 0;
	return clusters.map((cluster) => {
		const speck =
			cluster.areaKm2 < clusters[0].areaKm2 * specks.share ||
			Math.sqrt(cluster.areaKm2) * scale * kmInRadii < specks.side;
		const suits = suit();
		const place = layout.frame.insetChoices[cluster.id]?.place ?? suits;
		// a map is a map of something: the largest group stays
		return { ...cluster, speck, suits, place: cluster === clusters[0] ? 'frame' : place };
		function suit(): ClusterPlace {
			if (world || inFrame.includes(cluster)) return 'frame';
			if (whole(cluster)) return 'box';
			return speck || ++boxes > mostBoxes ? 'out' : 'box';
		}
	});
}

const kmInRadii = 1 / 6371.0088;

/** Whether a group holds the largest piece of some region, which would be lost without it. */
function wholeRegions(coverage: Coverage, clusters: Cluster[]) {
	const most = new Float64Array(coverage.keys.length);
	for (const { regions } of clusters)
		for (const { region, areaKm2 } of regions) most[region] = Math.max(most[region], areaKm2);
	return ({ regions }: Cluster) => regions.some(({ region, areaKm2 }) => areaKm2 === most[region]);
}

/** Most points measured for one frame. */
const mostPoints = 4000;

/** The scale at which some parts fit the box together, on the projection that they would be drawn on. */
function frameScale(
	coverage: Coverage,
	layout: Pick<SheetLayout, 'projection'> & { frame: FrameLayout },
	box: Box,
) {
	return (parts: number[]): number => {
		const { arcPoints, ...rest } = partsOnly(coverage, parts);
		const { projection } = chooseProjection(extentOf({ arcPoints, ...rest }), layout);
		let [left, right, top, bottom] = [Infinity, -Infinity, Infinity, -Infinity];
		const step = Math.max(1, Math.floor(arcPoints.length / 2 / mostPoints));
		for (let i = 0; i < arcPoints.length / 2; i += step) {
			const [x, y] = projection([arcPoints[2 * i], arcPoints[2 * i + 1]])!;
			[left, right] = [Math.min(left, x), Math.max(right, x)];
			[top, bottom] = [Math.min(top, y), Math.max(bottom, y)];
		}
		return Math.min(
			box.width / Math.max(right - left, 1e-12),
			box.height / Math.max(bottom - top, 1e-12),
		);
	};
}
