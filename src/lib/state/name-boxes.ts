import type { DrawnText } from '$lib/engines/sheet/drawing';

/** A box on the paper, in hundredths of a millimetre. */
export interface NameBox {
	left: number;
	top: number;
	right: number;
	bottom: number;
}

/** Parts of the type size above and below a baseline. */
const [rise, drop] = [0.74, 0.23];

/** Where the name of each region stands, all its lines together; by region. */
export function nameBoxes(texts: readonly DrawnText[]): Map<number, NameBox> {
	const boxes = new Map<number, NameBox>();
	for (const { layer, region, x, y, width, size } of texts) {
		if (layer !== 'label' || region === undefined) continue;
		const box = { left: x, top: y - rise * size, right: x + width, bottom: y + drop * size };
		const whole = boxes.get(region);
		boxes.set(region, whole ? joined(whole, box) : box);
	}
	return boxes;
}

const joined = (a: NameBox, b: NameBox): NameBox => ({
	left: Math.min(a.left, b.left),
	top: Math.min(a.top, b.top),
	right: Math.max(a.right, b.right),
	bottom: Math.max(a.bottom, b.bottom),
});
