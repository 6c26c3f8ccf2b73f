import type { BorderList } from '$lib/engines/borders/border-list';

/** For every region the borders it has: entries `starts[r] .. starts[r + 1] - 1` of `borders`. */
export interface RegionLinks {
	starts: Uint32Array;
	borders: Uint32Array;
}

/**
 * In: borders between regions 0..count-1, and which of them join. Out: each of those twice, under either
 * region, in list order.
 */
export function linkRegions(
	count: number,
	{ a, b }: Pick<BorderList, 'a' | 'b'>,
	joins: (border: number) => boolean = () => true,
): RegionLinks {
	const starts = new Uint32Array(count + 1);
	for (let border = 0; border < a.length; border++) {
		if (!joins(border)) continue;
		starts[a[border] + 1]++;
		starts[b[border] + 1]++;
	}
	for (let region = 0; region < count; region++) starts[region + 1] += starts[region];
	const next = starts.slice(0, count);
	const borders = new Uint32Array(starts[count]);
	for (let border = 0; border < a.length; border++) {
		if (!joins(border)) continue;
		borders[next[a[border]]++] = border;
		borders[next[b[border]]++] = border;
	}
	return { starts, borders };
}

export interface Neighbour {
	region: number;
	/** index into the border list */
	border: number;
}

/** The regions beyond each border of one region, longest border first. */
export function neighboursOf(region: number, list: BorderList, links: RegionLinks): Neighbour[] {
	const own = links.borders.subarray(links.starts[region], links.starts[region + 1]);
	return Array.from(own, (border) => ({
		border,
		region: list.a[border] === region ? list.b[border] : list.a[border],
	})).sort((one, other) => list.metres[other.border] - list.metres[one.border]);
}
