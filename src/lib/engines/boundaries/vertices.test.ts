import { describe, expect, it } from 'vitest';
import { gridPerDegree, VertexTable } from './vertices.ts';

/** A multiply-and-shift mixer, 0 to 1. */
function share(i: number): number {
	const h = Math.imul(i + 1, 0x9e3779b1);
	return ((h ^ (h >>> 15)) >>> 0) / 2 ** 32;
}

/** Positions of which many fall into the same cell, some far away and some crowded. */
const positions = Array.from({ length: 20_000 }, (_, i): [number, number] => {
	const place = Math.floor(share(i) * 6000);
	const spread = place % 3 === 0 ? 100 : 1e-4;
	const aside = (share(i + 77_777) - 0.5) * 0.9;
	const at = (n: number, origin: number) =>
		origin + (Math.floor(share(n) * spread * gridPerDegree) + aside) / gridPerDegree;
	return [at(2 * place, -20), at(2 * place + 1, -60)];
});

describe('the vertex table', () => {
	it.each([
		['when it must grow', 10, 1e-4],
		['when it is large enough', 10_000, 1e-4],
		['when all fall into one tile', 10_000, 400],
		['when every cell is a tile', 10_000, 0],
	])('numbers one vertex a grid cell, as a map of cells does, %s', (_, expected, step) => {
		const west = -21;
		const table = new VertexTable(west, expected, step);
		const cells = new Map<string, { number: number; least: [number, number] }>();
		for (const [lon, lat] of positions) {
			const code = `${Math.round((lon - west) * gridPerDegree)} ${Math.round((lat + 90) * gridPerDegree)}`;
			const known = cells.get(code);
			const number = known?.number ?? cells.size;
			if (!known) cells.set(code, { number, least: [lon, lat] });
			else if (lon < known.least[0] || (lon === known.least[0] && lat < known.least[1])) {
				known.least = [lon, lat];
			}
			expect(table.at(lon, lat)).toBe(number);
		}
		expect(table.count).toBe(cells.size);
		for (const { number, least } of cells.values()) {
			expect([table.positions[2 * number], table.positions[2 * number + 1]]).toEqual(least);
		}
	});
});
