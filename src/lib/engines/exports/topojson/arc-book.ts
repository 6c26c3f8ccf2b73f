import type { Coverage } from '../../boundaries/coverage.ts';
import { arcLonLat, type LonLat } from '../../sheet/plane/ring-lonlat.ts';

/** Longitudes at the ends of the range stand for the same meridian. */
const turned = (lon: number): number => ((((lon + 180) % 360) + 360) % 360) - 180;
const nameOf = (points: LonLat[]): string =>
	points.map(([lon, lat]) => `${turned(lon).toFixed(9)} ${lat.toFixed(9)}`).join();

/**
 * The arcs of a file: the coverage's own under their numbers, and after them pieces of those that run
 * across 180 degrees, each once.
 */
export class ArcBook {
	readonly arcs: LonLat[][] = [];
	readonly #named = new Map<string, number>();
	readonly #ends = new Set<string>();

	constructor(coverage: Coverage) {
		for (let arc = 0; arc + 1 < coverage.arcStarts.length; arc++) {
			this.arcs.push(settled(arcLonLat(coverage, arc)));
		}
	}

	/** Makes the arcs of a ring known by their places, so that pieces of the ring can be found among them. */
	know(signed: number): void {
		const arc = signed < 0 ? ~signed : signed;
		const points = this.arcs[arc];
		this.#ends.add(nameOf([points[0]])).add(nameOf([points[points.length - 1]]));
		this.#named.set(nameOf(points), arc);
	}

	/** A closed line as signed arcs: those known where they lie in it, new ones between them. */
	signedArcs(ring: LonLat[]): number[] {
		const start = ring.findIndex((point) => this.#isEnd(point));
		const open = ring.slice(0, -1);
		const from = Math.max(start, 0);
		const turn = [...open.slice(from), ...open.slice(0, from), open[from % open.length]];
		const signed: number[] = [];
		let piece: LonLat[] = [turn[0]];
		turn.slice(1).forEach((point, i) => {
			piece.push(point);
			if (!this.#isEnd(point) && i + 2 < turn.length) return;
			signed.push(this.#find(piece));
			piece = [point];
		});
		return signed;
	}

	/** Pieces end where arcs do, and where they were cut, so that both sides of a border have the same. */
	#isEnd(point: LonLat): boolean {
		return Math.abs(point[0]) === 180 || this.#ends.has(nameOf([point]));
	}

	#find(points: LonLat[]): number {
		const back = points.toReversed();
		for (const [line, sign] of [
			[points, false],
			[back, true],
		] as const) {
			const arc = this.#named.get(nameOf(line));
			if (arc !== undefined && sameSide(this.arcs[arc], line)) return sign ? ~arc : arc;
		}
		this.#named.set(nameOf(points), this.arcs.length);
		return this.arcs.push(points) - 1;
	}
}

/** Not one turn apart, as along 180 degrees itself. */
const sameSide = (a: LonLat[], b: LonLat[]): boolean =>
	a.every(([lon], i) => Math.abs(lon - b[i][0]) < 1);

function settled(points: LonLat[]): LonLat[] {
	let [west, east] = [Infinity, -Infinity];
	for (const [lon] of points) [west, east] = [Math.min(west, lon), Math.max(east, lon)];
	const shift = 360 * Math.round((west + east) / 2 / 360);
	return shift ? points.map(([lon, lat]) => [lon - shift, lat]) : points;
}
