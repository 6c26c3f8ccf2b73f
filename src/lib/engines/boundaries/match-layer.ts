import type { Finding } from './finding.ts';
import { nameRegions, type Naming } from './keys.ts';
import { matchOutlines, withoutSegments, type Matched } from './match.ts';
import { spikeFinding, spikesOf, tongueFinding, tonguesOf } from './no-width.ts';
import { giveBack, nodeOutlines } from './node-outlines.ts';
import type { BoundaryOptions } from './options.ts';
import { outlinesOf, type RingRepairs } from './outlines-of.ts';
import type { RawLayer } from './raw-layer.ts';
import { Refusal } from './refusal.ts';
import { relabel, ringsOf } from './relabel.ts';
import { settleParallel } from './settle-parallel.ts';

export interface MatchedLayer {
	naming: Naming;
	repairs: RingRepairs;
	matched: Matched;
	/** on what was left out: features without area, spikes, touches along them */
	findings: Finding[];
}

/**
 * Matches the outlines of all features, leaves out those of which nothing remains once their spikes are
 * gone, and names the rest. Where a tolerance makes a region vanish, it is left out and all is matched
 * again.
 */
export function matchLayer(
	layer: RawLayer,
	west: number,
	options: BoundaryOptions,
	stage: (message: string, share: number) => void,
): MatchedLayer {
	const kept: boolean[] = new Array(layer.regions).fill(true);
	const { outlines, repairs, room } = outlinesOf(layer, west);
	layer.releasePoints();
	for (;;) {
		const noded = nodeOutlines(ringsOf(outlines, kept), room);
		const tongues = tonguesOf(settleParallel(noded.segments), noded);
		for (const f of withoutSegments(noded, layer.regions)) kept[f] = false;
		const naming = nameRegions(layer.table, kept, options);
		const { keys, names, regionOf } = naming;
		if (keys.length === 0) throw new Refusal('no-areas', 'No feature of the file has an area.');
		const spikes = spikeFinding(spikesOf(noded.outlines), naming);
		const labelled = relabel(noded, regionOf, keys.length);
		settleParallel(labelled.segments);
		stage('Cutting the shared borders', 0.75);
		const matched = matchOutlines(labelled, keys, names, options);
		if (!('vanished' in matched)) {
			const touches = tongueFinding(tongues, naming, matched.survey.borders);
			const findings = [...leftOutFinding(kept, naming), ...spikes, ...touches];
			return { naming, repairs, matched, findings };
		}
		giveBack(labelled.segments, room);
		const gone = new Set(matched.vanished);
		regionOf.forEach((region, f) => {
			if (gone.has(region)) kept[f] = false;
		});
	}
}

function leftOutFinding(kept: boolean[], naming: Naming): Finding[] {
	const features = [...kept.keys()].filter((f) => !kept[f]);
	if (features.length === 0) return [];
	const named = features.slice(0, 10).map((f) => {
		const key = naming.wanted[f];
		return key && key !== String(f + 1) ? `${f + 1} (${key})` : f + 1;
	});
	const more = features.length > 10 ? ` and ${features.length - 10} more` : '';
	const message = `Features without an area were left out: number ${named.join(', ')}${more} in the file.`;
	return [{ code: 'no-area', severity: 'warning', message, regions: [], at: null }];
}
