import { createWriteStream } from 'node:fs';
import { once } from 'node:events';

/** A made-up land: a square of cells with wavy sides, each side drawn once and walked from both cells. */
export interface ManyRegions {
	/** cells along each side of the square */
	cells: number;
	/** corners inside each side of a cell */
	inner: number;
	seed: number;
}

/** Writes the land as GeoJSON with six decimals; answers the bytes written. The same for a seed. */
export async function writeManyRegions(file: string, land: ManyRegions): Promise<number> {
	const out = createWriteStream(file);
	let bytes = 0;
	const write = async (text: string) => {
		bytes += text.length;
		if (!out.write(text)) await once(out, 'drain');
	};
	await write('{"type":"FeatureCollection","features":[\n');
	for (let y = 0; y < land.cells; y++) {
		for (let x = 0; x < land.cells; x++) await write((x || y ? ',\n' : '') + cell(land, x, y));
	}
	await write('\n]}\n');
	out.end();
	await once(out, 'finish');
	return bytes;
}

function cell(land: ManyRegions, x: number, y: number): string {
	const ring = [
		...side(land, x, y, 1, 0),
		...side(land, x + 1, y, 0, 1),
		...side(land, x, y + 1, 1, 0).reverse(),
		...side(land, x, y, 0, 1).reverse(),
	].filter((place, i, all) => place !== all[i - 1]);
	const id = `${y}-${x}`;
	return `{"type":"Feature","id":"${id}","properties":{"name":"Cell ${id}"},"geometry":{"type":"Polygon","coordinates":[[${ring.join(',')}]]}}`;
}

/** Places from a corner of the mosaic to the next one east or north, both included. */
function side(land: ManyRegions, x: number, y: number, dx: number, dy: number): string[] {
	const places: string[] = [];
	for (let i = 0; i <= land.inner + 1; i++) {
		const share = i / (land.inner + 1);
		const isCorner = i === 0 || i > land.inner;
		const [cx, cy] = isCorner && i ? [x + dx, y + dy] : [x, y];
		const wave = isCorner ? 0 : noise(land.seed, 2 * (y * 65536 + x) + dx, i) * 0.3;
		const along = isCorner ? 0 : share;
		const px = cx + dx * along + dy * wave * Math.min(share, 1 - share);
		const py = cy + dy * along + dx * wave * Math.min(share, 1 - share);
		places.push(`[${(px * 0.05 - 4).toFixed(6)},${(py * 0.05 + 45).toFixed(6)}]`);
	}
	return places;
}

/** -1 to 1 from three whole numbers (a multiply-and-shift mixer). */
function noise(seed: number, a: number, b: number): number {
	let h = Math.imul(seed ^ Math.imul(a, 0x9e3779b1) ^ Math.imul(b, 0x85ebca6b), 0xc2b2ae35);
	h = Math.imul(h ^ (h >>> 15), 0x27d4eb2f);
	return ((h ^ (h >>> 13)) >>> 0) / 2 ** 31 - 1;
}
