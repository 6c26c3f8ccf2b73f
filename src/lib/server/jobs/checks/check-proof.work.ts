import { z } from 'zod';
import { checkProofFile } from '../../../engines/colouring/index.ts';
import { answered, statsSince, type Answer } from '../../api/answer.ts';
import { parseJson } from '../../api/read-json.ts';
import type { Task } from '../task-port.ts';

/** `POST /check/proof`, from the bytes of the body to those of the answer: the checker judges all of it. */
export const checkProofJson = ({ input }: Task<Uint8Array>): Promise<Answer> =>
	answered(() => {
		const file = parseJson(input, z.unknown());
		const started = performance.now();
		const checked = checkProofFile(file);
		return { ...checked, stats: statsSince(started) };
	});
