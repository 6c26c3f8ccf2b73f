import { boxAround, ownShare, type Ground } from './ground.ts';
import type { Pole } from './pole.ts';
import type { TextBox } from './text-box.ts';

/** Least part of a name that lies on its own region. */
const mostlyOwn = 0.62;
/** Places tried round the pole, in parts of the box across and down. */
const across = [0, -0.12, 0.12, -0.24, 0.24];
const down = [0, -0.3, 0.3];
/** Clear space all round, in parts of the type size. */
const clear = 0.12;

/**
 * The place round the pole where most of a name lies on its own region, the rest over its borders; it
 * covers no other name. Null where less than three fifths would.
 */
export function spotOver(
	ground: Ground,
	region: number,
	pole: Pole,
	box: TextBox,
): { x: number; y: number; own: number } | null {
	let best: { x: number; y: number; own: number } | null = null;
	const pad = 2 * box.size * clear;
	for (const dy of down) {
		for (const dx of across) {
			const x = pole.x + dx * box.width;
			const y = pole.y + dy * box.height;
			const own = ownShare(ground, boxAround(x, y, box.width + pad, box.height + pad), region);
			if (own >= mostlyOwn && own > (best?.own ?? 0) + 0.02) best = { x, y, own };
		}
	}
	return best;
}
