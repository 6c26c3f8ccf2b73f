import { z } from 'zod';
import { stats } from './common.ts';

/** Described here for readers; the checker alone judges it, field by field, and says what is wrong. */
export const proofRequest = z
	.looseObject({ form: z.literal('merestone proof 1') })
	.describe('a proof file, as GET /sheets/{sheet}/proof answers it');

export const proofResponse = z.strictObject({
	valid: z.boolean().describe('every claim of the file was shown'),
	claims: z.array(z.string()).describe('what was shown, in sentences'),
	faults: z.array(z.string()).describe('what was not, and why'),
	gaveUp: z.boolean().describe('a claim was too large to be settled: it may hold or not'),
	about: z.string().describe('what the file is about; empty when it is no proof file'),
	stats,
});
