import { createHash } from 'node:crypto';
import type { Db } from '../database/connection.ts';
import { readAttributesText, readGeometry } from '../repositories/boundaries.repository.ts';
import { NotFound } from './outcomes.ts';

/** SHA-256 over the coverage and the attributes of a boundary set as they are stored, hex. */
export async function boundariesDigest(db: Db, setId: string): Promise<string> {
	const geometry = await readGeometry(db, setId);
	if (!geometry) throw new NotFound('boundary set');
	const hash = createHash('sha256').update(geometry);
	return hash.update(await readAttributesText(db, setId)).digest('hex');
}
