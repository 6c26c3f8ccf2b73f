import { once } from 'node:events';
import { createWriteStream } from 'node:fs';

/**
 * A made-up land: cells in rows, each side a fractal line that is drawn once and walked from both cells.
 * Who touches whom is known from the rows alone: `fractalNeighbours`.
 */
export interface FractalLand {
	regions: number;
	/** corners inside each side of a cell */
	inner: number;
	seed: number;
	/** leaves every other corner out of the sides of every other cell: its neighbours' corners lie on its edges */
	isHalved?: boolean;
}

type Side = [x: number, y: number][];

const cellDegrees = 0.05;
const [west, south] = [-4, 45];
const perDegree = 1e7;
/** how much less a side half as long strays: the graph of a Brownian bridge with Hurst exponent 0.7 */
const strayAtHalf = 2 ** -0.7;

const columnsOf = ({ regions }: FractalLand) => Math.ceil(Math.sqrt(regions));

/** Writes the land as GeoJSON with seven decimals; answers the bytes written. The same for a seed. */
export async function writeFractalLand(file: string, land: FractalLand): Promise<number> {
	const out = createWriteStream(file);
	let bytes = 0;
	for (const text of fractalText(land)) {
		bytes += text.length;
		if (!out.write(text)) await once(out, 'drain');
	}
	out.end();
	await once(out, 'finish');
	return bytes;
}

/** The text of that file, a cell at a time. */
export function* fractalText(land: FractalLand): Generator<string> {
	yield '{"type":"FeatureCollection","features":[\n';
	const columns = columnsOf(land);
	let below = row(land, 0);
	for (let y = 0; y * columns < land.regions; y++) {
		const above = row(land, y + 1);
		let left = side(land, 0, y, 1);
		for (let x = 0; x < columns && y * columns + x < land.regions; x++) {
			const right = side(land, x + 1, y, 1);
			yield (x || y ? ',\n' : '') + cell(land, x, y, [below[x], right, above[x], left]);
			left = right;
		}
		below = above;
	}
	yield '\n]}\n';
}

const row = (land: FractalLand, y: number) =>
	Array.from({ length: columnsOf(land) }, (_, x) => side(land, x, y, 0));

function cell(land: FractalLand, x: number, y: number, sides: Side[]): string {
	const [south, east, north, west] = land.isHalved && (x + y) % 2 ? sides.map(halved) : sides;
	const places = [...south, ...east.slice(1)];
	for (const line of [north, west]) {
		for (let i = line.length - 2; i >= 0; i--) places.push(line[i]);
	}
	const id = y * columnsOf(land) + x;
	const ring = places.map(([px, py]) => `[${degrees(px)},${degrees(py)}]`).join(',');
	return `{"type":"Feature","id":"${id}","properties":{"name":"Cell ${id}"},"geometry":{"type":"Polygon","coordinates":[[${ring}]]}}`;
}

const degrees = (units: number) => (units / perDegree).toFixed(7);

const halved = (line: Side): Side => line.filter((_, i) => i % 2 === 0 || i === line.length - 1);

/**
 * The side east (axis 0) or north (1) of a mosaic corner, in grid units, both corners included. It strays
 * from the straight line by midpoint displacement, never by more than 0.9 of the way to the nearer corner,
 * so that no two sides cross.
 */
function side(land: FractalLand, x: number, y: number, axis: 0 | 1): Side {
	const last = land.inner + 1;
	const stray = new Float64Array(last + 1);
	const code = 2 * (y * 65536 + x) + axis;
	const displace = (from: number, to: number, size: number) => {
		if (to - from < 2) return;
		const middle = (from + to) >> 1;
		const mean = (stray[from] + stray[to]) / 2;
		const most = (0.9 * Math.min(middle, last - middle)) / last;
		const wanted = mean + size * noise(land.seed, code, middle);
		stray[middle] = Math.max(-most, Math.min(most, wanted));
		displace(from, middle, size * strayAtHalf);
		displace(middle, to, size * strayAtHalf);
	};
	displace(0, last, 0.2);
	const line = Array.from(stray, (aside, i): [number, number] => {
		const along = i / last;
		const [px, py] = axis ? [x + aside, y + along] : [x + along, y + aside];
		return [grid(px, west), grid(py, south)];
	});
	return land.isHalved ? straightened(line) : line;
}

const grid = (cells: number, origin: number) =>
	Math.round((cells * cellDegrees + origin) * perDegree);

/** The corners that will be left out of one of the two cells are laid on the line between the others. */
function straightened(line: Side): Side {
	for (let i = 1; i + 1 < line.length; i += 2) {
		const [[x1, y1], [x2, y2]] = [line[i - 1], line[i + 1]];
		line[i] = [Math.round((x1 + x2) / 2), Math.round((y1 + y2) / 2)];
	}
	return line;
}

/** Calls `found` for each pair that touches, lower number first, and whether only in a corner. */
export function fractalNeighbours(
	land: FractalLand,
	found: (a: number, b: number, isPoint: boolean) => void,
): void {
	const columns = columnsOf(land);
	for (let a = 0; a < land.regions; a++) {
		const isLast = a % columns === columns - 1;
		const meets = (b: number, isPoint: boolean) => b < land.regions && found(a, b, isPoint);
		if (!isLast) meets(a + 1, false);
		if (a % columns) meets(a + columns - 1, true);
		meets(a + columns, false);
		if (!isLast) meets(a + columns + 1, true);
	}
}

/** How many corners of one cell lie on an edge of another. */
export function cornersOnEdges(land: FractalLand): number {
	if (!land.isHalved) return 0;
	let lines = 0;
	fractalNeighbours(land, (_a, _b, isPoint) => (lines += Number(!isPoint)));
	return lines * Math.ceil(land.inner / 2);
}

/** -1 to 1 from three whole numbers (a multiply-and-shift mixer). */
function noise(seed: number, a: number, b: number): number {
	let h = Math.imul(seed ^ Math.imul(a, 0x9e3779b1) ^ Math.imul(b, 0x85ebca6b), 0xc2b2ae35);
	h = Math.imul(h ^ (h >>> 15), 0x27d4eb2f);
	return ((h ^ (h >>> 13)) >>> 0) / 2 ** 31 - 1;
}
