import { asSeenBy } from '$lib/engines/colour';
import { shapeLayersTop, type Hatching } from '$lib/engines/sheet';
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

/** Whether two drawings of one sheet have the same shapes on their tiles; those above border lines are lettering. */
export function sameOnTiles(one: Drawing, two: Drawing): boolean {
	if (one.shapes === two.shapes) return true;
	const top: readonly string[] = shapeLayersTop;
	const below = ({ shapes }: Drawing) => shapes.filter(({ layer }) => !top.includes(layer));
	const [a, b] = [below(one), below(two)];
	return (
		a.length === b.length &&
		a.every(({ points, fill, stroke }, i) => {
			const other = b[i];
			return points === other.points && fill === other.fill && stroke === other.stroke;
		})
	);
}
