import type { Trx } from '../database/connection.ts';
import type { ReadGround } from '../jobs/read-ground.ts';
import { insertBoundarySet } from '../repositories/boundaries.repository.ts';
import { insertLevels } from '../repositories/display-levels.repository.ts';
import { insertPieces } from '../repositories/pieces.repository.ts';

/** The file that a boundary set was read from, and for whom. */
export interface StoredFile {
	teamId: string;
	createdBy: string | null;
	name: string;
	bytes: number;
	digest: string;
}

/** Stores an accepted reading whole, for an upload or a re-cut. */
export async function storeBoundarySet(
	trx: Trx,
	file: StoredFile,
	read: ReadGround,
): Promise<string> {
	const id = await insertBoundarySet(trx, noteOf(file, read), read.columns);
	await insertPieces(trx, id, read.pieces);
	await insertLevels(trx, id, read.levels);
	return id;
}

const noteOf = (file: StoredFile, read: ReadGround) => ({
	team_id: file.teamId,
	file_name: file.name,
	file_digest: file.digest,
	file_bytes: file.bytes,
	source: JSON.stringify(read.source),
	columns: read.attributeColumns,
	region_count: read.columns.regions.key.length,
	geometry: Buffer.from(read.geometry),
	planar: read.planar,
	planar_witness: read.planarWitness && JSON.stringify(read.planarWitness),
	found: JSON.stringify(read.found),
	options: JSON.stringify(read.options),
	gaps_km: read.options.acrossWaterKm ?? 0,
	created_by: file.createdBy,
});
