import {
	checkProofFile,
	proofFile,
	proofText,
	type ColouringResult,
	type ProofFile,
} from '../../engines/colouring/index.ts';
import { exportProofZip } from '../../engines/exports/index.ts';
import { problemOf } from '../services/draft-problem.ts';
import type { DraftInput } from './colour.work.ts';
import type { Task } from './task-port.ts';

export type ProofFormat = 'json' | 'zip';

export interface ProofInput extends DraftInput {
	names: string[];
	title: string;
	/** as it is stored with the draft */
	result: ColouringResult;
	format: ProofFormat;
}

/** The bytes of a proof, or why there are none. */
export type WrittenProof = { bytes: Uint8Array } | { missing: 'nothing-shown' | 'nothing-refuted' };

/** Writes the proof of a stored result, in a thread, and has the checker of such files read it first. */
export async function writeProof({ input }: Task<ProofInput>): Promise<WrittenProof> {
	const { keys, names, draft, result, title, format } = input;
	const regions = keys.map((key, region) => ({ key, name: names[region] }));
	const file = await proofFile(problemOf(input, draft), result, regions);
	if (!file || !holds(file)) return { missing: 'nothing-shown' };
	if (format === 'json') return { bytes: new TextEncoder().encode(proofText(file)) };
	const bytes = exportProofZip(file, title);
	return bytes ? { bytes } : { missing: 'nothing-refuted' };
}

/** A proof that does not hold is a fault of ours; one too long for the checker is not handed out. */
function holds(file: ProofFile): boolean {
	const { valid, gaveUp, faults } = checkProofFile(file);
	if (!valid && !gaveUp) throw new Error(`the checker refused a proof: ${faults.join(' ')}`);
	return valid;
}
