/** A clean land of shaken squares, and ways to spoil it that leave its neighbours in doubt. */
import type { Feature, MultiPolygon } from 'geojson';
import { multi } from './dirty-maps.ts';

type Point = number[];

export interface Land {
	size: number;
	/** outline of the cell in column x, row y: south-west, south-east, north-east, north-west */
	cells: Map<string, Point[]>;
	/** parts and copies that cells get beside their outline */
	more: Map<string, Point[]>;
}

const step = 0.01;

export function shakenLand(size: number, shakes: number[]): Land {
	const at = (x: number, y: number) => {
		const i = 2 * (y * (size + 1) + x);
		return [x * step + shakes[i] * 0.002, y * step + shakes[i + 1] * 0.002];
	};
	const cells = new Map<string, Point[]>();
	for (let y = 0; y < size; y++) {
		for (let x = 0; x < size; x++) {
			cells.set(`${x}.${y}`, [at(x, y), at(x + 1, y), at(x + 1, y + 1), at(x, y + 1)]);
		}
	}
	return { size, cells, more: new Map() };
}

export function featuresOf(land: Land): Feature<MultiPolygon>[] {
	return [...land.cells].map(([key, ring]) => {
		const extra = land.more.get(key);
		return multi(key, [ring], ...(extra ? [[extra]] : []));
	});
}

const along = (p: Point, q: Point, share: number): Point => [
	p[0] + share * (q[0] - p[0]),
	p[1] + share * (q[1] - p[1]),
];

const shifted = ([x, y]: Point, dx: number, dy: number): Point => [x + dx, y + dy];

/** Each spoils the cell in column x of a row of its own; `size` is at least 6. */
export const defects: Record<string, (land: Land, x: number) => void> = {
	/** the east edge bends inwards by some 20 m and the neighbour's does not */
	sliver(land, x) {
		const [sw, se, ne, nw] = land.cells.get(`${x}.1`)!;
		land.cells.set(`${x}.1`, [sw, se, shifted(along(se, ne, 0.5), -0.0002, 0), ne, nw]);
	},
	/** the east edge bends over the neighbour's by some 200 m */
	overlap(land, x) {
		const [sw, se, ne, nw] = land.cells.get(`${x}.2`)!;
		land.cells.set(`${x}.2`, [sw, se, shifted(along(se, ne, 0.4), 0.002, 0), ne, nw]);
	},
	/** a cell is there again under another key */
	double(land, x) {
		land.cells.set(`copy`, land.cells.get(`${x}.3`)!);
	},
	/** the outer edge makes a loop */
	loop(land, x) {
		const [sw, se, ne, nw] = land.cells.get(`${x}.0`)!;
		const back = [0.6, 0.4].map((share) => shifted(along(sw, se, share), 0, -0.002));
		land.cells.set(`${x}.0`, [sw, ...back, se, ne, nw]);
	},
	/** a piece of the outer edge belongs to a cell in another corner of the land */
	crumb(land, x) {
		const [sw, se, ne, nw] = land.cells.get(`${x}.${land.size - 1}`)!;
		const [p, q] = [along(ne, nw, 0.45), along(ne, nw, 0.5)];
		const [r, s] = [shifted(q, 0, -0.0005), shifted(p, 0, -0.0005)];
		land.cells.set(`${x}.${land.size - 1}`, [sw, se, ne, p, s, r, q, nw]);
		land.more.set('0.0', [p, q, r, s]);
	},
	/** both cells keep the line, one with a corner a few millimetres off it */
	noise(land, x) {
		const [sw, se, ne, nw] = land.cells.get(`${x}.4`)!;
		land.cells.set(`${x}.4`, [sw, se, shifted(along(se, ne, 0.3), 3e-8, 0), ne, nw]);
	},
};
