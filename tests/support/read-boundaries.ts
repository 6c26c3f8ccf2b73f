import type { Feature, Polygon } from 'geojson';
import {
	readBoundaries,
	sourceOf,
	type BoundariesResult,
	type BoundaryOptions,
} from '../../src/lib/engines/boundaries/index.ts';
import { borderKinds } from '../../src/lib/engines/borders/index.ts';

type Accepted = Extract<BoundariesResult, { status: 'accepted' }>;
type Refused = Extract<BoundariesResult, { status: 'refused' }>;

/** Reads bytes that must be accepted. */
export async function accepted(bytes: Uint8Array, options?: BoundaryOptions): Promise<Accepted> {
	const read = await readBoundaries(sourceOf('test', bytes), options);
	if (read.status !== 'accepted') throw new Error(`not accepted: ${JSON.stringify(read)}`);
	return read;
}

/** Reads bytes that must be refused. */
export async function refusal(bytes: Uint8Array, options?: BoundaryOptions): Promise<Refused> {
	const read = await readBoundaries(sourceOf('test', bytes), options);
	if (read.status !== 'refused') throw new Error(`not refused: ${read.status}`);
	return read;
}

interface Collection<F> {
	type: 'FeatureCollection';
	features: F[];
}

export const readText = (text: string) =>
	readBoundaries(sourceOf('test', new TextEncoder().encode(text)));

/** Reads features that must be accepted. */
export const acceptedFeatures = (features: Feature[], options?: BoundaryOptions) =>
	accepted(new TextEncoder().encode(JSON.stringify(collection(features))), options);

/** "a-b line", sorted: pairs by key, whatever the numbers of the regions. */
export function pairsOf(read: Accepted): string[] {
	const { a, b, kind } = read.borders;
	const { keys } = read.coverage;
	return Array.from(a, (_, i) => {
		const pair = [keys[a[i]], keys[b[i]]].sort().join('-');
		return `${pair} ${borderKinds[kind[i]]}`;
	}).sort();
}

/** Metres of each pair by key. */
export function metresOf(read: Accepted): Record<string, number> {
	const { a, b, metres } = read.borders;
	const { keys } = read.coverage;
	return Object.fromEntries(
		Array.from(a, (_, i) => [[keys[a[i]], keys[b[i]]].sort().join('-'), metres[i]]),
	);
}

export const collection = <F extends Feature>(features: F[]): Collection<F> => ({
	type: 'FeatureCollection',
	features,
});

/** A region from the corners of its rings; rings are closed here. */
export function region(id: string, ...rings: number[][][]): Feature<Polygon> {
	const coordinates = rings.map((ring) => [...ring, ring[0]]);
	return { type: 'Feature', id, properties: {}, geometry: { type: 'Polygon', coordinates } };
}

export const box = (id: string, west: number, south: number, east: number, north: number) =>
	region(id, [
		[west, south],
		[east, south],
		[east, north],
		[west, north],
	]);
