import type { Member } from '../../src/lib/server/access/member.ts';
import { runRecut } from '../../src/lib/server/jobs/recut.job.ts';
import type { Workshop } from '../../src/lib/server/jobs/workshop.ts';
import { beginFileRecut } from '../../src/lib/server/services/recut-begin.service.ts';
import { readRecut } from '../../src/lib/server/services/recuts.service.ts';
import { ingest, uploadRequest } from './workshop.ts';

/** A rectangle of land: key, west, south, east, north in hundredths of a degree, and a name where it has one. */
export type Plot = [key: string, west: number, south: number, east: number, north: number];

/** Plots as a boundary file: the key as the feature's id and in the column `code`, a name that follows from it. */
export const plotsFile = (plots: Plot[]): string =>
	JSON.stringify({
		type: 'FeatureCollection',
		features: plots.map(([key, ...edges]) => {
			const [w, s, e, n] = edges.map((edge) => 10 + edge / 100);
			const ring = [
				[w, s],
				[e, s],
				[e, n],
				[w, n],
				[w, s],
			];
			return {
				type: 'Feature',
				id: key,
				properties: { code: key, called: `Plot ${key}` },
				geometry: { type: 'Polygon', coordinates: [ring] },
			};
		}),
	});

/**
 *     g h i      30
 *     d e f      20
 *     a b c      10
 *   0 ... 30      0
 */
export const before: Plot[] = [...'abcdefghi'].map((key, place) => {
	const [x, y] = [(place % 3) * 10, Math.floor(place / 3) * 10];
	return [key, x, y, x + 10, y + 10];
});

/**
 * What becomes of them: a is called z, b is cut into b1 and b2, d and e are one (de), i is gone, n is new;
 * c, f, g and h stay.
 */
export const after: Plot[] = [
	['z', 0, 0, 10, 10],
	['b1', 10, 0, 16, 10],
	['b2', 16, 0, 20, 10],
	['c', 20, 0, 30, 10],
	['de', 0, 10, 20, 20],
	['f', 20, 10, 30, 20],
	['g', 0, 20, 10, 30],
	['h', 10, 20, 20, 30],
	['n', 30, 0, 40, 10],
];

export const plotsSheet = async (shop: Workshop, member: Member): Promise<number> =>
	(await ingest(shop, member, 'plots.geojson', plotsFile(before))).sheet ?? 0;

const never = new AbortController().signal;

/** Has every re-cut of a sheet that waits read, and answers how this one ended. */
export async function readOut(shop: Workshop, member: Member, sheet: number, recut: number) {
	const row = await shop.db
		.selectFrom('recuts')
		.innerJoin('sheets', 'sheets.id', 'recuts.sheet_id')
		.select('recuts.id')
		.where('sheets.team_id', '=', member.team.id)
		.where('sheets.number', '=', sheet)
		.where('recuts.number', '=', recut)
		.executeTakeFirstOrThrow();
	await runRecut(shop, row.id, never);
	return readRecut(shop, member, sheet, recut);
}

/** Sends another file for a sheet and has it read and compared at once. */
export async function recutWith(
	shop: Workshop,
	member: Member,
	sheet: number,
	plots: Plot[] = after,
	fields: Record<string, string> = {},
) {
	const request = uploadRequest('later.geojson', plotsFile(plots), fields);
	const { number } = await beginFileRecut(shop, member, sheet, request);
	return readOut(shop, member, sheet, number);
}
