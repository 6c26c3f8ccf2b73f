import {
	decodeCoverage,
	type BoundaryOptions,
	type Finding,
} from '../../engines/boundaries/index.ts';
import { matchRegions, type RegionMatch } from '../../engines/boundaries/recut/index.ts';
import type { BorderList } from '../../engines/borders/index.ts';
import type { CarriedRow, RecutChange } from '../../schemas/recut.ts';
import { carryOver, type Standing } from './recut-carry.ts';
import { fileSource } from './file-source.ts';
import { readAnswered, type KnownAnswer } from './read-answered.ts';
import { groundOf, type ReadGround, type RefusedReading } from './read-ground.ts';
import { changeOf } from './recut-change.ts';
import { teller, type Task } from './task-port.ts';

export interface RecutInput {
	path: string;
	fileName: string;
	options: BoundaryOptions;
	/** what the team answered about earlier files */
	answers: KnownAnswer[];
	/** the boundaries that stand */
	before: { geometry: Uint8Array; borders: BorderList; findings: Finding[] };
	/** what was decided on them, for a look ahead at what follows */
	standing: Standing;
}

export type RecutOutcome =
	| RefusedReading
	| ({
			status: 'accepted';
			matching: RegionMatch;
			change: RecutChange;
			/** foreseen */
			report: CarriedRow[];
	  } & ReadGround);

/** Reads boundaries and compares them with those that stand; nothing is coloured before they are applied. */
export async function readRecutFile({ input, port }: Task<RecutInput>): Promise<RecutOutcome> {
	const tell = teller(port);
	tell('Reading', 0);
	const source = fileSource(input.path, input.fileName);
	const reading = await readAnswered(source, input.options, input.answers, (step, share) =>
		tell(step, 0.7 * share),
	);
	const { result, taken } = reading;
	if (result.status === 'refused') return { ...result, taken };
	tell('Matching the regions', 0.72);
	const { geometry, ...before } = input.before;
	const matching = matchRegions(decodeCoverage(geometry), result.coverage);
	tell('Comparing the borders', 0.88);
	const change = changeOf(matching, before, result);
	tell('Carrying decisions over', 0.92);
	const fresh = { borders: result.borders, columns: result.attributes.columns };
	const { report } = carryOver(matching, input.standing, fresh);
	tell('Thinning borders for the screen and packing', 0.94);
	return { status: 'accepted', ...groundOf(result, reading), matching, change, report };
}
