import type { Draft } from '../../engines/editions/draft.ts';
import {
	rulesFromCsv,
	rulesToCsv,
	type RulesCsvGround,
	type RulesRead,
} from '../../engines/editions/rules-csv.ts';
import type { Task } from './task-port.ts';

export interface RulesOut {
	draft: Draft;
	keys: readonly string[];
	names: readonly string[];
}

/** The rules of a draft as a table, written in a thread: a large sheet may lock every region. */
export const writeRules = ({ input: { draft, keys, names } }: Task<RulesOut>): Uint8Array =>
	new TextEncoder().encode(rulesToCsv(draft, new Map(keys.map((key, i) => [key, names[i]]))));

/** A table of rules read in a thread. */
export const readRulesTable = ({
	input: { bytes, ground },
}: Task<{ bytes: Uint8Array; ground: RulesCsvGround }>): RulesRead => rulesFromCsv(bytes, ground);
