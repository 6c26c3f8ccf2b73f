/**
 * Coverages for tests, made from TopoJSON, whose arcs are shared already, by a route of its own: areas
 * by d3-geo on a sphere, lengths by great circles. Good enough to draw; not for measuring.
 */
import { geoArea, geoLength } from 'd3-geo';
import { feature } from 'topojson-client';
import type { GeometryCollection, Topology } from 'topojson-specification';
import type { BorderList } from '../../src/lib/engines/borders/border-list.ts';
import type { Coverage } from '../../src/lib/engines/boundaries/coverage.ts';

const earthKm = 6371.0088;

/** Area under a ring in plain longitude and latitude, the short way across 180; positive anticlockwise. */
function turn(points: number[][]): number {
	let sum = 0;
	let lon = 0;
	points.forEach(([x, y], i) => {
		const [px, py] = points[(i || points.length) - 1];
		const step = x - px - 360 * Math.round((x - px) / 360);
		sum += lon * y - (lon + step) * py;
		lon += step;
	});
	return sum;
}

function decode({ arcs, transform }: Topology): number[][][] {
	const [[kx, ky], [dx, dy]] = [transform?.scale ?? [1, 1], transform?.translate ?? [0, 0]];
	return arcs.map((arc) => {
		let [x, y] = [0, 0];
		return arc.map(([ax, ay]) => {
			[x, y] = transform ? [x + ax, y + ay] : [ax, ay];
			return [x * kx + dx, y * ky + dy];
		});
	});
}

export interface CoverageOptions {
	key?: (properties: Record<string, unknown>, id: string, index: number) => string;
	name?: (properties: Record<string, unknown>) => string;
	keep?: (properties: Record<string, unknown>, id: string) => boolean;
}

export function coverageFrom(
	topology: Topology,
	object: string,
	options: CoverageOptions = {},
): Coverage {
	const lines = decode(topology);
	const collection = topology.objects[object] as GeometryCollection<Record<string, unknown>>;
	const geometries = collection.geometries.filter(
		(one) =>
			(one.type === 'Polygon' || one.type === 'MultiPolygon') &&
			(options.keep?.(one.properties ?? {}, String(one.id)) ?? true),
	);
	const used = new Map<number, number>();
	const arcLeft: number[] = [];
	const arcRight: number[] = [];
	const own = (signed: number, region: number): number => {
		const from = signed < 0 ? ~signed : signed;
		if (!used.has(from)) {
			used.set(from, used.size);
			arcLeft.push(-1);
			arcRight.push(-1);
		}
		const arc = used.get(from)!;
		(signed < 0 ? arcRight : arcLeft)[arc] = region;
		return signed < 0 ? ~arc : arc;
	};
	const ringArcs: number[] = [];
	const ringStarts = [0];
	const partRings = [0];
	const regionParts = [0];
	const areasKm2: number[] = [];
	geometries.forEach((geometry, region) => {
		const parts = (
			geometry.type === 'Polygon' ? [geometry.arcs] : (geometry as { arcs: number[][][] }).arcs
		) as number[][][];
		for (const rings of parts) {
			rings.forEach((ring, i) => {
				const points = ring.flatMap((signed) =>
					(signed < 0 ? lines[~signed].toReversed() : lines[signed]).slice(1),
				);
				const anticlockwise = turn(points) > 0;
				const turned =
					anticlockwise === (i === 0) ? ring : ring.toReversed().map((signed) => ~signed);
				ringArcs.push(...turned.map((signed) => own(signed, region)));
				ringStarts.push(ringArcs.length);
			});
			partRings.push(ringStarts.length - 1);
		}
		regionParts.push(partRings.length - 1);
		areasKm2.push(geoArea(feature(topology, geometry)) * earthKm ** 2);
	});
	const arcs = [...used.keys()].map((from) => lines[from]);
	const arcStarts = [0];
	for (const line of arcs) arcStarts.push(arcStarts[arcStarts.length - 1] + line.length);
	return {
		keys: geometries.map(
			(one, i) => options.key?.(one.properties ?? {}, String(one.id), i) ?? String(one.id ?? i),
		),
		names: geometries.map((one) =>
			options.name
				? options.name(one.properties ?? {})
				: String((one.properties as { name?: unknown } | undefined)?.name ?? ''),
		),
		arcPoints: Float64Array.from(arcs.flat(2)),
		arcStarts: Uint32Array.from(arcStarts),
		arcLeft: Int32Array.from(arcLeft),
		arcRight: Int32Array.from(arcRight),
		arcMetres: Float64Array.from(
			arcs,
			(line) => geoLength({ type: 'LineString', coordinates: line }) * earthKm * 1000,
		),
		ringArcs: Int32Array.from(ringArcs),
		ringStarts: Uint32Array.from(ringStarts),
		partRings: Uint32Array.from(partRings),
		regionParts: Uint32Array.from(regionParts),
		areasKm2: Float64Array.from(areasKm2),
		enclaveOf: new Int32Array(geometries.length).fill(-1),
	};
}

/** Line borders of a coverage, read from the sides of its arcs. */
export function bordersOf(coverage: Coverage): BorderList {
	const pairs = new Map<string, { a: number; b: number; metres: number; at: [number, number] }>();
	coverage.arcLeft.forEach((left, arc) => {
		const right = coverage.arcRight[arc];
		if (left < 0 || right < 0 || left === right) return;
		const [a, b] = [Math.min(left, right), Math.max(left, right)];
		const point = 2 * coverage.arcStarts[arc];
		const at: [number, number] = [coverage.arcPoints[point], coverage.arcPoints[point + 1]];
		const pair = pairs.get(`${a} ${b}`) ?? { a, b, metres: 0, at };
		pair.metres += coverage.arcMetres[arc];
		pairs.set(`${a} ${b}`, pair);
	});
	const list = [...pairs.values()].sort((p, q) => p.a - q.a || p.b - q.b);
	return {
		a: Uint32Array.from(list, ({ a }) => a),
		b: Uint32Array.from(list, ({ b }) => b),
		kind: new Uint8Array(list.length),
		metres: Float64Array.from(list, ({ metres }) => metres),
		at: Float64Array.from(list.flatMap(({ at }) => at)),
	};
}

/** A proper colouring, largest degree first, each region the first ink its neighbours leave. */
export function greedyColouring(borders: BorderList, regions: number): Int32Array {
	const next: number[][] = Array.from({ length: regions }, () => []);
	borders.a.forEach((a, i) => {
		next[a].push(borders.b[i]);
		next[borders.b[i]].push(a);
	});
	const inks = new Int32Array(regions).fill(-1);
	const order = next.map((_, i) => i).sort((p, q) => next[q].length - next[p].length || p - q);
	for (const region of order) {
		const near = new Set(next[region].map((other) => inks[other]));
		let ink = 0;
		while (near.has(ink)) ink++;
		inks[region] = ink;
	}
	return inks;
}
