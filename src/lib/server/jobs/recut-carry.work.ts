import type { RegionMatch } from '../../engines/boundaries/recut/index.ts';
import type { RecutChange, RecutDecision } from '../../schemas/recut.ts';
import { carryOver, decided, type CarriedOver, type Fresh, type Standing } from './recut-carry.ts';
import { regionsOf } from './recut-change.ts';
import { pairChanges } from './recut-pairs.ts';
import type { BorderList } from '../../engines/borders/index.ts';
import type { Task } from './task-port.ts';

export interface CarryInput {
	matching: RegionMatch;
	decisions: RecutDecision[];
	/** borders as they were read, of the boundaries that stand and of the new ones */
	before: BorderList;
	after: BorderList;
	standing: Standing;
	fresh: Fresh;
}

export type CarryOutcome =
	/** why the decisions cannot be, each a sentence */
	| { status: 'refused'; reasons: string[] }
	| ({ status: 'carried'; change: Omit<RecutChange, 'findings'> } & CarriedOver);

/** Corrects a matching by what people decided, and carries everything over by it. */
export function carryRecut({ input }: Task<CarryInput>): CarryOutcome {
	const { matching, decisions, before, after, standing, fresh } = input;
	const result = decided(matching, decisions);
	if (result.status === 'refused') return result;
	const { match } = result;
	return {
		status: 'carried',
		...carryOver(match, standing, fresh),
		change: { ...regionsOf(match), pairs: pairChanges(match, before, after) },
	};
}
