import { Replay } from './drup-replay.ts';

interface Line {
	taken: boolean;
	literals: number[];
}

export interface ReplayLimits {
	/** the highest variable the clauses and the proof may name; looked up when absent */
	variables?: number;
	/** literals looked at before giving up; without end when absent */
	steps?: number;
	/** literals in the lines of the proof, each line counting as eight more, before giving up: for memory */
	literals?: number;
}

export interface Replayed {
	valid: boolean;
	reason?: string;
	/** the limits were met before it was told whether the proof holds */
	gaveUp?: boolean;
}

/**
 * Replays a refutation. Shares no code with the solver: it knows only unit propagation.
 *
 * In: clauses as lists of non-zero integers (v or -v, v from 1); the proof as text, one clause a line
 * ended by 0, lines that start with `d` take a clause away. Out: whether every line follows from the
 * clauses before it by unit propagation and a contradiction is reached; else the first fault. Lines after
 * the contradiction are not looked at. With limits given, input of whatever kind ends in bounds.
 * Source: Goldberg and Novikov 2003 (reverse unit propagation); the text form is DRUP (Heule, Hunt and
 * Wetzler 2013). Taking away a clause that forces a literal does not take back the literal, which is
 * sound, since only consequences are ever added.
 */
export function checkDrup(
	clauses: readonly (readonly number[])[],
	proof: string,
	limits: ReplayLimits = {},
): Replayed {
	const highest = limits.variables ?? HIGHEST;
	const known = (literal: number) => isLiteral(literal) && Math.abs(literal) <= highest;
	if (!clauses.every((clause) => clause.every(known))) {
		return { valid: false, reason: 'a clause holds no literal' };
	}
	const replay = new Replay(limits.variables ?? highestIn(clauses, proof), limits.steps);
	for (const clause of clauses) replay.add(clause);
	return replayLines(replay, proof, { known, most: limits.literals ?? Infinity });
}

const tooLong: Replayed = { valid: false, gaveUp: true, reason: 'it is too long to be replayed' };

function replayLines(
	replay: Replay,
	proof: string,
	{ known, most }: { known: (literal: number) => boolean; most: number },
): Replayed {
	let number = 0;
	let held = 0;
	for (const text of linesOf(proof)) {
		if (replay.spent) return tooLong;
		if (replay.contradiction) break;
		number++;
		const line = parse(text, known);
		if (line === null) return { valid: false, reason: `line ${number} is not a clause` };
		if (line === 'nothing') continue;
		held += line.literals.length + LINE;
		if (held > most) return tooLong;
		if (line.taken) replay.remove(line.literals);
		else if (replay.follows(line.literals)) replay.add(line.literals);
		else if (replay.spent) return tooLong;
		else return { valid: false, reason: `line ${number} does not follow` };
	}
	if (replay.spent) return tooLong;
	return replay.contradiction
		? { valid: true }
		: { valid: false, reason: 'the lines end without a contradiction' };
}

const HIGHEST = 2 ** 28;
/** what keeping a line takes beside its literals, in literals */
const LINE = 8;

const isLiteral = (value: number) =>
	Number.isInteger(value) && value !== 0 && Math.abs(value) <= HIGHEST;

/** One after the other: a long proof cut into lines at once would need many times its length. */
function* linesOf(text: string): Generator<string> {
	for (let from = 0; from <= text.length;) {
		const end = text.indexOf('\n', from);
		yield text.slice(from, end < 0 ? text.length : end);
		from = end < 0 ? text.length + 1 : end + 1;
	}
}

const numeral = /^(0|-?[1-9][0-9]{0,9})$/;

/** Null for a line that is no clause; empty lines and comments say nothing. */
function parse(text: string, known: (literal: number) => boolean): Line | 'nothing' | null {
	const words = text.trim().split(/\s+/);
	if (words[0] === '' || words[0] === 'c') return 'nothing';
	const taken = words[0] === 'd';
	const numerals = taken ? words.slice(1) : words;
	if (!numerals.every((word) => numeral.test(word))) return null;
	const literals = numerals.map(Number);
	return literals.pop() === 0 && literals.every(known) ? { taken, literals } : null;
}

function highestIn(clauses: readonly (readonly number[])[], proof: string): number {
	let most = 0;
	const look = (literals: readonly number[]) => {
		for (const literal of literals) most = Math.max(most, Math.abs(literal));
	};
	clauses.forEach(look);
	for (const text of linesOf(proof)) {
		const line = parse(text, isLiteral);
		if (line && line !== 'nothing') look(line.literals);
	}
	return most;
}
