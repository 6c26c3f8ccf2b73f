import type { BorderList } from '../borders/border-list.ts';
import type { Coverage } from '../boundaries/coverage.ts';
import type { WeakBorder } from '../palettes/palette.ts';
import { chainsOf } from './chains.ts';
import type { LineLayer } from './drawing.ts';
import type { LineLook, RankLook } from './layout/lines.ts';
import { hundredths } from './paper.ts';
import type { SheetArcs } from './plane/quantise.ts';

/** The regions on both sides of the arcs that are drawn, which may be more than the coverage's. */
export type ArcSides = Pick<Coverage, 'arcLeft' | 'arcRight'>;

/**
 * Line widths on A4 in hundredths of a millimetre: each rank clearly heavier than the one below. An outer edge
 * is a coast as often as not, and drawn fine; around a level above it is as heavy as that, so that it closes.
 */
const widths = { region: 14, fineRegion: 9, group: 38, outer: 22, weak: 90, weakCore: 40 };

export interface LineInput {
	sides: ArcSides;
	arcs: SheetArcs;
	borders: BorderList;
	groups: (string | null)[];
	weak: WeakBorder[];
	/** from `paperScale` */
	scale: number;
	/** many small regions: borders drawn finer, so that they leave the fills room */
	fine: boolean;
	look: LineLook;
	/** a colour as the drawing's reader sees it */
	see: (hex: string) => string;
}

/**
 * Every border once, in the layer of the highest rank it has: outer edge, border between two groups,
 * border between two regions. Borders that some reader could miss are drawn again on top as a double
 * line, which tells without hue. Empty layers are left out.
 */
export function lineLayers({
	sides,
	arcs,
	borders,
	groups,
	weak,
	scale,
	fine,
	look,
	see,
}: LineInput): LineLayer[] {
	const ranks: Record<'region' | 'group' | 'outer' | 'weak', number[]> = {
		region: [],
		group: [],
		outer: [],
		weak: [],
	};
	const marked = weakPairs(borders, weak, groups.length);
	for (let arc = 0; arc + 1 < arcs.arcStarts.length; arc++) {
		if (arcs.arcStarts[arc + 1] - arcs.arcStarts[arc] < 2) continue;
		const [a, b] = [sides.arcLeft[arc], sides.arcRight[arc]];
		if (a === b) continue;
		if (a < 0 || b < 0) ranks.outer.push(arc);
		else ranks[groups[a] !== groups[b] ? 'group' : 'region'].push(arc);
		if (marked.has(pairKey(a, b, groups.length))) ranks.weak.push(arc);
	}
	const line = (rank: string, width: number, hex: string, list: number[]): LineLayer => ({
		rank,
		width: Math.max(5, Math.round(width * scale)),
		hex,
		arcs: Uint32Array.from(list),
	});
	const ranked = (rank: 'region' | 'group' | 'outer', width: number): LineLayer => {
		const plain = line(rank, width, '#000000', ranks[rank]);
		const own = look[rank];
		return own ? lookedAt(plain, own, arcs, see) : plain;
	};
	return [
		ranked('region', fine ? widths.fineRegion : widths.region),
		ranked('group', widths.group),
		ranked('outer', ranks.group.length ? widths.group : widths.outer),
		line('weak', widths.weak, '#000000', ranks.weak),
		line('weak-core', widths.weakCore, '#ffffff', ranks.weak),
	].filter(({ arcs: list }) => list.length > 0);
}

/** A rank as somebody set it, in millimetres on this very sheet whatever its size. */
function lookedAt(
	plain: LineLayer,
	{ widthMm, hex, dashMm }: RankLook,
	arcs: SheetArcs,
	see: (hex: string) => string,
): LineLayer {
	const looked = { ...plain, width: Math.max(2, hundredths(widthMm)), hex: see(hex), own: hex };
	if (dashMm.length === 0) return looked;
	const dash = dashMm.map((mm) => Math.max(1, hundredths(mm)));
	return { ...looked, dash, chains: chainsOf(arcs, plain.arcs) };
}

function pairKey(a: number, b: number, regions: number): number {
	return Math.min(a, b) * regions + Math.max(a, b);
}

function weakPairs({ a, b }: BorderList, weak: WeakBorder[], regions: number): Set<number> {
	return new Set(weak.map(({ border }) => pairKey(a[border], b[border], regions)));
}
