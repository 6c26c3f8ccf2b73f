import { openProof, type OpenProof, type ProofFile } from '../colouring/index.ts';
import { csvField } from './csv.ts';
import { plainLine } from './plain-line.ts';
import { proofReadMe } from './proof-read-me.ts';
import { zipOf } from './repeatable-zip.ts';

/**
 * What a proof file shows to be impossible, for the tools of others, as one zip:
 *
 * - `part.col`: regions and borders of the part, in the DIMACS .col form (D. S. Johnson and M. A. Trick,
 *   Cliques, Coloring, and Satisfiability, 1996);
 * - `part.cnf`: the clauses, in the DIMACS CNF form (same source), with what each variable says;
 * - `proof.drup`: a refutation of them (M. Heule, W. Hunt and N. Wetzler 2013), unless none was found;
 * - `regions.csv`: which number is which region; `read-me.txt`: what it shows and how to check it.
 *
 * Null when the file claims nothing of the kind. Byte for byte repeatable.
 */
export function exportProofZip(file: ProofFile, title: string): Uint8Array | null {
	const proof = openProof(file);
	if (!proof) return null;
	return zipOf({
		'read-me.txt': proofReadMe(file, proof, title),
		'part.col': partCol(file, proof),
		'part.cnf': partCnf(file, proof),
		...(proof.proof === null ? {} : { 'proof.drup': drupText(proof.proof) }),
		'regions.csv': regionsCsv(file, proof),
	});
}

const lines = (list: readonly string[]): string => list.map((line) => `${line}\n`).join('');

function partCol({ regions }: ProofFile, { regions: part, borders }: OpenProof): string {
	return lines([
		'c The borders that the proof needs among its regions',
		'c vertex, key of the region',
		...part.map((region, i) => `c ${i + 1} ${plainLine(regions[region].key)}`),
		`p edge ${part.length} ${borders.length}`,
		...borders.map(([a, b]) => `e ${a + 1} ${b + 1}`),
	]);
}

function partCnf({ regions }: ProofFile, { regions: part, inks, clauses }: OpenProof): string {
	const says = part.flatMap((region, i) =>
		inks.map((ink, c) => {
			const key = plainLine(regions[region].key);
			return `c ${i * inks.length + c + 1}: region ${key} has ink ${ink}`;
		}),
	);
	return lines([
		'c What cannot all be true at once; each variable and what it says:',
		...says,
		`p cnf ${part.length * inks.length} ${clauses.length}`,
		...clauses.map((clause) => [...clause, 0].join(' ')),
	]);
}

/** Ends with the empty clause, which some tools want to see written. */
function drupText(proof: string): string {
	return /(^|\n)0\n?$/.test(proof) ? proof : `${proof}0\n`;
}

function regionsCsv({ regions }: ProofFile, { regions: part }: OpenProof): string {
	const rows = part.map((region, i) => [i + 1, regions[region].key, regions[region].name ?? '']);
	return [['vertex', 'key', 'name'], ...rows]
		.map((row) => `${row.map(csvField).join(',')}\r\n`)
		.join('');
}
