import type { Ground } from './ground.ts';
import type { Pen } from './paint-area.ts';

/**
 * Lines of several arcs, each in one stroke. None is passed over: the dashes of one that only begins outside
 * the area have to come into it as they would on the whole sheet.
 */
export function strokeChains(
	pen: Pen,
	ground: Ground,
	chains: readonly Int32Array[],
	{ hex, width }: { hex: string; width: number },
): void {
	const { arcPoints: p, arcStarts } = ground;
	pen.strokeStyle = hex;
	pen.lineWidth = width;
	for (const chain of chains) {
		let begun = false;
		pen.beginPath();
		for (const signed of chain) {
			const arc = signed < 0 ? ~signed : signed;
			const [first, last] = [arcStarts[arc], arcStarts[arc + 1] - 1];
			for (let step = begun ? 1 : 0; step <= last - first; step++) {
				const at = 2 * (signed < 0 ? last - step : first + step);
				if (begun) pen.lineTo(p[at], p[at + 1]);
				else pen.moveTo(p[at], p[at + 1]);
				begun = true;
			}
		}
		if (comesBack(ground, chain)) pen.closePath();
		pen.stroke();
	}
}

/** Whether a line ends where it begins: its corner there is joined, as in the SVG. */
function comesBack({ arcPoints: p, arcStarts }: Ground, chain: Int32Array): boolean {
	const endOf = (signed: number) => (signed < 0 ? arcStarts[~signed] : arcStarts[signed + 1] - 1);
	const [from, to] = [endOf(~chain[0]), endOf(chain[chain.length - 1])];
	return p[2 * from] === p[2 * to] && p[2 * from + 1] === p[2 * to + 1];
}
