import { asSeenBy } from '$lib/engines/colour';
import type { Hatching } from '$lib/engines/sheet';
import type { Drawing } from '$lib/engines/sheet/drawing';

/** Which regions of a drawing are hatched, as tiles are told; null where none is. */
export function hatchingOf({ inks, fills, reader }: Drawing): Hatching | null {
	const looks: Hatching['looks'] = [];
	const lookOf = inks.map(({ hatch }) =>
		hatch ? looks.push({ ...hatch, hex: asSeenBy(hatch.hex, reader) }) : 0,
	);
	if (looks.length === 0) return null;
	return { looks, of: Uint8Array.from(fills, ({ ink }) => (ink < 0 ? 0 : (lookOf[ink] ?? 0))) };
}
