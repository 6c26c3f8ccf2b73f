import { checkProofText, notJson } from '../../../engines/colouring/index.ts';
import { answered, statsSince, type Answer } from '../../api/answer.ts';
import { ApiFault } from '../../api/fault.ts';
import type { Task } from '../task-port.ts';

/** `POST /check/proof`, from the bytes of the body to those of the answer: the checker judges all of it. */
export const checkProofJson = ({ input }: Task<Uint8Array>): Promise<Answer> =>
	answered(() => {
		const text = textOf(input);
		const started = performance.now();
		const checked = checkProofText(text);
		if (checked.faults[0] === notJson) throw new ApiFault(400, 'malformed', 'the body is not JSON');
		return { ...checked, stats: statsSince(started) };
	});

function textOf(bytes: Uint8Array): string {
	try {
		return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
	} catch (cause) {
		throw Object.assign(new ApiFault(400, 'malformed', 'the body is not UTF-8'), { cause });
	}
}
