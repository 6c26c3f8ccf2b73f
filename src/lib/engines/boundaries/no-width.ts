import type { BorderList } from '../borders/border-list.ts';
import type { Finding } from './finding.ts';
import type { Naming } from './keys.ts';
import type { Noded } from './node-outlines.ts';
import type { Outlines } from './outlines.ts';
import type { Squeezed } from './settle-parallel.ts';

/** The tips of needles: corners where an outline turns straight back on itself, first of each feature. */
export function spikesOf(outlines: Outlines): Map<number, [number, number]> {
	const { ringVertices: v, ringStarts, ringRegion, positions } = outlines;
	const tips = new Map<number, [number, number]>();
	for (let ring = 0; ring < ringRegion.length; ring++) {
		const [from, to] = [ringStarts[ring], ringStarts[ring + 1]];
		if (to - from < 3) continue;
		for (let i = from; i < to; i++) {
			const before = v[i === from ? to - 1 : i - 1];
			const after = v[i + 1 === to ? from : i + 1];
			if (before !== after || tips.has(ringRegion[ring])) continue;
			tips.set(ringRegion[ring], [positions[2 * v[i]], positions[2 * v[i] + 1]]);
		}
	}
	return tips;
}

export function spikeFinding(tips: Map<number, [number, number]>, naming: Naming): Finding[] {
	const regions = new Set<number>();
	let at: Finding['at'] = null;
	for (const [feature, tip] of tips) {
		const region = naming.regionOf[feature];
		if (region < 0) continue;
		regions.add(region);
		at ??= tip;
	}
	if (regions.size === 0) return [];
	return [
		{
			code: 'spike-dropped',
			severity: 'note',
			message:
				'Outlines ran out to a tip and back on the same line; these spikes of no width were dropped.',
			regions: keysOf(regions, naming),
			at,
		},
	];
}

/** A line of no width where one feature runs along another. */
interface Tongue {
	/** features */
	one: number;
	other: number;
	at: [number, number];
}

export function tonguesOf(squeezed: Squeezed[], { segments, outlines }: Noded): Tongue[] {
	const found = new Map<string, Tongue>();
	const { positions: p } = outlines;
	for (const { region, other, segment } of squeezed) {
		const [one, two] = region < other ? [region, other] : [other, region];
		const code = `${one} ${two}`;
		if (found.has(code)) continue;
		const [u, v] = [2 * segments.low[segment], 2 * segments.high[segment]];
		found.set(code, { one, other: two, at: [(p[u] + p[v]) / 2, (p[u + 1] + p[v + 1]) / 2] });
	}
	return [...found.values()];
}

/** Features that touch only along such a line; a feature squeezed to a line altogether is named too. */
export function tongueFinding(tongues: Tongue[], naming: Naming, borders: BorderList): Finding[] {
	if (tongues.length === 0) return [];
	const kinds = new Map(Array.from(borders.a, (a, i) => [`${a} ${borders.b[i]}`, borders.kind[i]]));
	const regions = new Set<number>();
	const named: string[] = [];
	let at: Finding['at'] = null;
	for (const tongue of tongues) {
		const [a, b] = [tongue.one, tongue.other].map((f) => naming.regionOf[f]).sort((p, q) => p - q);
		const kind = kinds.get(`${a} ${b}`);
		if (kind === 0 || a === b) continue;
		const pair = [tongue.one, tongue.other].map((f) => naming.wanted[f]).sort();
		named.push(pair.join(' and ') + (kind === 1 ? ' (they meet in a point elsewhere)' : ''));
		for (const region of [a, b]) if (region >= 0) regions.add(region);
		at ??= tongue.at;
	}
	if (named.length === 0) return [];
	const pairs = [...new Set(named)].sort().join('; ');
	return [
		{
			code: 'touch-without-width',
			severity: 'warning',
			message: `These touch only along a line of no width, where one of them has no land, and are not counted as neighbours: ${pairs}.`,
			regions: keysOf(regions, naming),
			at,
		},
	];
}

const keysOf = (regions: Set<number>, naming: Naming) =>
	[...regions].sort((a, b) => a - b).map((region) => naming.keys[region]);
