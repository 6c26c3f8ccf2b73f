import { unzipSync, strFromU8 } from 'fflate';
import { describe, expect, it } from 'vitest';
import {
	complete,
	cycle,
	edgesOfCol,
	fixtureGraph,
	fromPairs,
	mycielski,
} from '../../../../tests/support/named-graphs.ts';
import { satisfiable } from '../../../../tests/support/reference-solver.ts';
import { colour, proofFile, type ColouringProblem } from '../colouring/index.ts';
import { exportProofZip } from './proof-files.ts';

const names = (count: number) =>
	Array.from({ length: count }, (_, i) => ({ key: `r${i}`, name: `=Région ${i}` }));

async function filesOf(problem: ColouringProblem) {
	const file = await proofFile(problem, await colour(problem), names(problem.regions));
	const zip = file && exportProofZip(file, 'Test\nsheet');
	if (!zip) throw new Error('no proof');
	const texts = Object.entries(unzipSync(zip)).map(([name, bytes]) => [name, strFromU8(bytes)]);
	return { zip, files: Object.fromEntries(texts) as Record<string, string> };
}

/** Reads the CNF form from its description; shares nothing with the writer. */
function readCnf(text: string): { variables: number; clauses: number[][] } {
	const said = text.split('\n').filter((line) => line !== '' && !line.startsWith('c'));
	const [p, form, variables, count] = said[0].split(' ');
	expect([p, form]).toEqual(['p', 'cnf']);
	const clauses: number[][] = [[]];
	for (const word of said.slice(1).join(' ').split(' ').filter(Boolean)) {
		if (word === '0') clauses.push([]);
		else clauses[clauses.length - 1].push(Number(word));
	}
	expect(clauses.pop()).toEqual([]);
	expect(clauses).toHaveLength(Number(count));
	return { variables: Number(variables), clauses };
}

/** Follows a DRUP proof line by line with the plainest unit propagation there is. */
function replays(clauses: number[][], proof: string): boolean {
	let held = clauses.map((clause) => [...clause]);
	for (const line of proof.split('\n').filter(Boolean)) {
		const words = line
			.split(' ')
			.filter((word) => word !== 'd')
			.map(Number);
		expect(words.pop()).toBe(0);
		const same = (clause: number[]) =>
			clause.length === words.length && words.every((literal) => clause.includes(literal));
		if (line.startsWith('d ')) {
			const at = held.findIndex(same);
			if (at >= 0) held = held.filter((_, i) => i !== at);
			continue;
		}
		if (
			!clashes(
				held,
				words.map((literal) => -literal),
			)
		)
			return false;
		if (words.length === 0) return true;
		held.push(words);
	}
	return false;
}

function clashes(clauses: number[][], given: number[]): boolean {
	const isTrue = new Set(given);
	for (let grew = true; grew;) {
		grew = false;
		for (const clause of clauses) {
			if (clause.some((literal) => isTrue.has(literal))) continue;
			const open = clause.filter((literal) => !isTrue.has(-literal));
			if (open.length === 0) return true;
			if (open.length > 1) continue;
			isTrue.add(open[0]);
			grew = true;
		}
	}
	return false;
}

const wheel = fromPairs(6, [
	...[1, 2, 3, 4, 5].map((i) => [i, (i % 5) + 1] as const),
	...[1, 2, 3, 4, 5].map((i) => [0, i] as const),
]);
const star = fromPairs(
	4,
	[1, 2, 3].map((i) => [0, i] as const),
);

const cases: [string, ColouringProblem][] = [
	['one region', { ...fromPairs(1, []), inks: 'fewest' }],
	['a border', { ...fromPairs(2, [[0, 1]]), inks: 'fewest' }],
	['an odd ring', { ...cycle(7), inks: 'fewest' }],
	['a clique', { ...complete(5), inks: 'fewest' }],
	['an odd wheel', { ...wheel, inks: 'fewest' }],
	['a critical part', { ...fixtureGraph('golomb'), inks: 'fewest' }],
	['a graph without triangles', { ...mycielski(cycle(5)), inks: 'fewest' }],
	['locks that collide', { ...star, inks: 3, locks: Int32Array.of(-1, 0, 1, 2) }],
	[
		'rules that collide, whatever the number of inks',
		{ ...star, inks: 'fewest', alike: [[0, 1]], forbidden: [[0, 1]] },
	],
];

describe('a proof for the tools of others', () => {
	it.each(cases)('%s: unsatisfiable by a reference solver, and replayed', async (_, problem) => {
		const { files } = await filesOf(problem);
		const { clauses, variables } = readCnf(files['part.cnf']);
		const literals = clauses.flat().map(Math.abs);
		expect(Math.max(0, ...literals)).toBeLessThanOrEqual(variables);
		expect(satisfiable(clauses)).toBe(false);
		expect(replays(clauses, files['proof.drup'])).toBe(true);
		// the same lines say nothing about regions that need no ink
		const needless = clauses.filter((clause) => clause.some((literal) => literal < 0));
		expect(replays(needless, files['proof.drup'])).toBe(false);
	});

	it.each(cases)('%s: every border of the part is one of the map', async (_, problem) => {
		const { files } = await filesOf(problem);
		const part = edgesOfCol(files['part.col']);
		const rows = files['regions.csv'].trim().split('\r\n').slice(1);
		expect(rows).toHaveLength(part.regions);
		const region = rows.map((row) => Number(/,r(\d+),/.exec(row)?.[1]));
		const { a, b } = problem.borders;
		const touch = (p: number, q: number) =>
			Array.from(a).some((x, i) => (x === p && b[i] === q) || (x === q && b[i] === p));
		part.borders.a.forEach((x, i) => {
			expect(touch(region[x], region[part.borders.b[i]])).toBe(true);
		});
	});

	it('says in comments what each variable is', async () => {
		const { files } = await filesOf({ ...cycle(3), inks: 'fewest' });
		const comments = files['part.cnf'].split('\n').filter((line) => /^c \d/.test(line));
		expect(comments).toHaveLength(3 * 2);
		expect(comments[0]).toMatch(/^c 1: region "r\d" has ink 0$/);
	});

	it('comes out the same byte for byte, and no name runs as a formula', async () => {
		const problem = { ...fixtureGraph('moser'), inks: 'fewest' as const };
		const [one, other] = [await filesOf(problem), await filesOf(problem)];
		expect(Buffer.from(one.zip).equals(Buffer.from(other.zip))).toBe(true);
		expect(one.files['regions.csv']).not.toMatch(/,=/);
		expect(one.files['read-me.txt']).toContain('"Test\\nsheet"');
	});
});
