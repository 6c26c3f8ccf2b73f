import {
	digestOf,
	editionContent,
	type EditionInput,
	type EditionOutcome,
} from '../../engines/editions/index.ts';
import type { Task } from './task-port.ts';

export type SealedEdition =
	| {
			status: 'complete';
			digest: string;
			/** the content as it is stored */
			stored: string;
	  }
	| Extract<EditionOutcome, { status: 'incomplete' }>;

/** Puts an edition's content together and digests it, and again from what is about to be stored. */
export async function sealEdition({ input }: Task<EditionInput>): Promise<SealedEdition> {
	const outcome = editionContent(input);
	if (outcome.status === 'incomplete') return outcome;
	const digest = await digestOf(outcome.content);
	const stored = JSON.stringify(outcome.content);
	if ((await digestOf(JSON.parse(stored))) !== digest) throw new Error('the digest does not hold');
	return { status: 'complete', digest, stored };
}
