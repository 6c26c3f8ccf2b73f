import { cleanText } from '$lib/engines/sheet/type/clean-text';
import type { RegionFill } from '$lib/engines/sheet/drawing';

/** The fills of a large sheet as columns in region order, without their rings. */
export interface PackedFills {
	ink: Int32Array;
	/** the colours there are, and which of them each region has */
	hexes: string[];
	hexOf: Uint16Array;
	locked: Uint8Array;
}

export function packFills(fills: readonly RegionFill[]): PackedFills {
	const numbers = new Map<string, number>();
	const number = (hex: string) => {
		const known = numbers.get(hex) ?? numbers.size;
		numbers.set(hex, known);
		return known;
	};
	const hexOf = Uint16Array.from(fills, ({ hex }) => number(hex));
	return {
		ink: Int32Array.from(fills, ({ ink }) => ink),
		...{ hexes: [...numbers.keys()], hexOf },
		locked: Uint8Array.from(fills, ({ locked }) => (locked ? 1 : 0)),
	};
}

/** The same fills, of regions with these keys and names. */
export function unpackFills(
	{ ink, hexes, hexOf, locked }: PackedFills,
	{ key, name }: { key: readonly string[]; name: readonly string[] },
): RegionFill[] {
	return key.map((one, region) => ({
		...{ region, key: one, name: cleanText(name[region]), ink: ink[region] },
		hex: hexes[hexOf[region]],
		...(locked[region] ? { locked: true } : {}),
		rings: [],
	}));
}
