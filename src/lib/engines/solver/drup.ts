import { Replay } from './drup-replay.ts';

interface Line {
	taken: boolean;
	literals: number[];
}

/**
 * Replays a refutation. Shares no code with the solver: it knows only unit propagation.
 *
 * In: clauses as lists of non-zero integers (v or -v, v from 1); the proof as text, one clause a line
 * ended by 0, lines that start with `d` take a clause away. Out: whether every line follows from the
 * clauses before it by unit propagation and a contradiction is reached; else the first fault.
 * Source: Goldberg and Novikov 2003 (reverse unit propagation); the text form is DRUP (Heule, Hunt and
 * Wetzler 2013). Taking away a clause that forces a literal does not take back the literal, which is
 * sound, since only consequences are ever added.
 */
export function checkDrup(
	clauses: readonly (readonly number[])[],
	proof: string,
): { valid: boolean; reason?: string } {
	if (!clauses.every((clause) => clause.every(isLiteral))) {
		return { valid: false, reason: 'a clause holds no literal' };
	}
	const lines = proof.split('\n').map(parse);
	const broken = lines.indexOf(null);
	if (broken >= 0) return { valid: false, reason: `line ${broken + 1} is not a clause` };
	const replay = new Replay(highest(clauses, lines));
	for (const clause of clauses) replay.add(clause);
	for (let i = 0; i < lines.length && !replay.contradiction; i++) {
		const line = lines[i];
		if (line === 'nothing' || line === null) continue;
		if (line.taken) replay.remove(line.literals);
		else if (replay.follows(line.literals)) replay.add(line.literals);
		else return { valid: false, reason: `line ${i + 1} does not follow` };
	}
	return replay.contradiction
		? { valid: true }
		: { valid: false, reason: 'the lines end without a contradiction' };
}

const HIGHEST = 2 ** 28;

const isLiteral = (value: number) =>
	Number.isInteger(value) && value !== 0 && Math.abs(value) <= HIGHEST;

/** Null for a line that is no clause; empty lines and comments say nothing. */
function parse(text: string): Line | 'nothing' | null {
	const words = text.trim().split(/\s+/);
	if (words[0] === '' || words[0] === 'c') return 'nothing';
	const taken = words[0] === 'd';
	const literals = (taken ? words.slice(1) : words).map(Number);
	return literals.pop() === 0 && literals.every(isLiteral) ? { taken, literals } : null;
}

function highest(
	clauses: readonly (readonly number[])[],
	lines: readonly (Line | 'nothing' | null)[],
): number {
	let most = 0;
	const look = (literals: readonly number[]) => {
		for (const literal of literals) most = Math.max(most, Math.abs(literal));
	};
	clauses.forEach(look);
	for (const line of lines) if (line && line !== 'nothing') look(line.literals);
	return most;
}
