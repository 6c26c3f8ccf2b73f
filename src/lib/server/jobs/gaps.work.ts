import { decodeCoverage } from '../../engines/boundaries/index.ts';
import { gapsWithin, type BorderList } from '../../engines/borders/index.ts';
import type { StoredGaps } from '../repositories/gaps.repository.ts';
import type { Task } from './task-port.ts';

export interface GapsInput {
	/** the coverage as it is stored */
	geometry: Uint8Array;
	/** as found when the file was read */
	borders: BorderList;
	km: number;
}

export interface GapsOutput {
	gaps: StoredGaps;
	/** up to which width all gaps are found; less than was asked for when the work ran out */
	withinKm: number;
}

/** Measures the gaps between regions that do not touch, up to so many kilometres. */
export function measureGaps({ input: { geometry, borders, km } }: Task<GapsInput>): GapsOutput {
	const found = gapsWithin(decodeCoverage(geometry), km, borders);
	const { a, b, metres, at } = found;
	return {
		gaps: {
			...{ a: [...a], b: [...b], metres: [...metres] },
			lon: Array.from(a, (_, i) => at[2 * i]),
			lat: Array.from(a, (_, i) => at[2 * i + 1]),
		},
		withinKm: found.withinKm,
	};
}
