/**
 * Lands for tests of re-cuts. Cells of a mosaic are given to regions; what is dissolved is dissolved by
 * topojson-client, and the reader of the product makes the coverage of it.
 */
import type { Feature, MultiPolygon, Polygon } from 'geojson';
import { mergeArcs, feature } from 'topojson-client';
import { topology } from 'topojson-server';
import type {
	GeometryCollection,
	MultiPolygon as TopoMultiPolygon,
	Polygon as TopoPolygon,
} from 'topojson-specification';
import type { Coverage } from '../../src/lib/engines/boundaries/coverage.ts';
import { acceptedFeatures, box, collection, region } from './read-boundaries.ts';

type Area = Feature<Polygon | MultiPolygon>;

/** Unit squares of a grid, numbered row by row from the south-west, `west` and `south` in degrees. */
export function gridCells(rows: number, columns: number, west = 10, south = 45): Area[] {
	const cells: Area[] = [];
	for (let r = 0; r < rows; r++) {
		for (let c = 0; c < columns; c++) {
			cells.push(box(`${cells.length}`, west + c, south + r, west + c + 1, south + r + 1));
		}
	}
	return cells;
}

/**
 * Four-cornered cells of a grid whose corners are moved by up to three tenths of a cell. `moves` holds
 * numbers from -1 to 1, two a corner; it is read round and round.
 */
export function bentCells(rows: number, columns: number, moves: readonly number[]): Area[] {
	const corner = (r: number, c: number) => {
		const at = 2 * (r * (columns + 1) + c);
		const move = (i: number) => 0.3 * (moves[i % moves.length] ?? 0);
		return [10 + c + move(at), 45 + r + move(at + 1)].map((v) => Number(v.toFixed(6)));
	};
	return Array.from({ length: rows * columns }, (_, cell) => {
		const [r, c] = [Math.floor(cell / columns), cell % columns];
		const ring = [corner(r, c), corner(r, c + 1), corner(r + 1, c + 1), corner(r + 1, c)];
		return region(`${cell}`, ring);
	});
}

/** The cells of each region dissolved into one area, by key. */
export function dissolved(cells: Area[], regions: Record<string, number[]>): Area[] {
	const whole = topology({ cells: collection(cells) });
	const { geometries } = whole.objects.cells as GeometryCollection<object>;
	const polygons = geometries as (TopoPolygon | TopoMultiPolygon)[];
	return Object.entries(regions).map(([key, own]) => {
		const arcs = mergeArcs(
			whole,
			own.map((cell) => polygons[cell]),
		);
		return { ...(feature(whole, arcs) as Feature<MultiPolygon>), id: key, properties: {} };
	});
}

/** A coverage of such a land. */
export async function landOf(cells: Area[], regions: Record<string, number[]>): Promise<Coverage> {
	return (await acceptedFeatures(dissolved(cells, regions))).coverage;
}
