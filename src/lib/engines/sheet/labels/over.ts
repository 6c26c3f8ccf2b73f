import { boxAround, ownShare, type Ground } from './ground.ts';
import type { Pole } from './pole.ts';
import { lineBoxes, type TextBox } from './text-box.ts';

/** Least part of a name, and of every line of it, that lies on its own region. */
const mostlyOwn = 0.68;
/** Places tried round the pole, in parts of the box across and down. */
const across = [0, -0.12, 0.12, -0.24, 0.24];
const down = [0, -0.3, 0.3];
/** Clear space all round, in parts of the type size. */
const clear = 0.12;

/**
 * The place round the pole where most of a name lies on its own region, the rest over its borders; it
 * covers no other name, and crosses no coast and no border of the level above. Null where less than two
 * thirds would, of the whole or of any line: a short line stands narrower than the whole, and may lie beside
 * the region while most of the whole is on it. Source: Imhof 1975, names lie wholly on land or wholly on water.
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
			const around = boxAround(x, y, box.width + pad, box.height + pad);
			const shares = [around, ...lineBoxes(box, x, y, pad)].map((part) =>
				ownShare(ground, part, region, mostlyOwn),
			);
			const own = Math.min(...shares);
			if (own >= mostlyOwn && own > (best?.own ?? 0) + 0.02) best = { x, y, own };
		}
	}
	return best;
}
