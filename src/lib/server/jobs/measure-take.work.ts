import type { ColumnOutcome } from '../../schemas/measure-review.ts';
import { joinKept, type JoinInput } from './measure-join.ts';
import { faultsInTaking } from './measure-checks.ts';
import { takeColumns, type Standing, type TakenColumn } from './measure-outcome.ts';
import type { Task } from './task-port.ts';

export interface TakeInput extends JoinInput {
	standing: Standing[];
}

/** A column ready to be stored, one entry a region. */
export interface ReadyColumn {
	outcome: ColumnOutcome;
	values: (number | null)[] | null;
	texts: (string | null)[] | null;
}

export interface TakeOutcome {
	columns: ReadyColumn[];
	joined: number;
	/** rows that name no region and are not decided */
	open: number;
	/** what the checkers found wrong, in words; empty when all holds */
	faults: string[];
}

/** Joins a table, takes the columns chosen and has the checkers look at both. */
export function takeMeasureTable({ input }: Task<TakeInput>): TakeOutcome {
	const { table, typed, join } = joinKept(input);
	if (!join) return { columns: [], joined: 0, open: table.rows, faults: [] };
	const taken = takeColumns({ table, typed, join }, input);
	const { exact, folded, zeros, 'by-hand': byHand } = join.counts;
	return {
		columns: taken.map(ready),
		joined: exact + folded + zeros + byHand,
		open: join.unmatched.length,
		faults: faultsInTaking({ table, typed, join }, input.regions, taken),
	};
}

const ready = ({ outcome, stored, texts }: TakenColumn): ReadyColumn => ({
	outcome,
	values: stored && Array.from(stored, (value) => (Number.isNaN(value) ? null : value)),
	texts,
});
