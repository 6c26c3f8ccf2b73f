import { checkProofFile, type OpenProof, type ProofFile } from '../colouring/index.ts';
import { caution } from '../sheet/layout.ts';
import { plainLine } from './plain-line.ts';

/** The page that goes with the open forms of a proof: what is shown, what each file holds, how to check. */
export function proofReadMe(file: ProofFile, proof: OpenProof, title: string): string {
	const { about, claims, faults } = checkProofFile(file);
	const { regions, borders, inks, clauses } = proof;
	return `Proof for the sheet ${plainLine(title)}

${about}
${[...claims, ...faults].map((sentence) => `- ${sentence}\n`).join('')}
Inks and, in the proof file of this product, regions count from 0; vertices and variables here from 1.

part.col     the ${regions.length} regions of the part and the ${borders.length} borders among them that
             are needed, in the DIMACS .col form
part.cnf     ${regions.length * inks.length} variables and ${clauses.length} clauses, in the DIMACS CNF form; comments
             tell what each variable says. They ask for a colouring of the part and for nothing else.
${
	proof.proof === null
		? `             A clause proof was not found within the effort. The regions named show it at sight.`
		: `proof.drup   a refutation of part.cnf in the DRUP text form: each line follows from the clauses
             before it by unit propagation, and the last one is the empty clause`
}
regions.csv  vertex, key and name of each region

To check it without trusting the program that made it:
1. Compare regions.csv and part.col with your own map: do these regions border?
2. Read part.cnf: each region has one of the inks; two that border do not share one; and, where the proof
   leans on rules, locks, forbidden inks and regions kept alike.
3. Have any satisfiability solver find part.cnf unsatisfiable, or have any checker of DRUP proofs replay
   proof.drup on part.cnf.

${caution}
`;
}
