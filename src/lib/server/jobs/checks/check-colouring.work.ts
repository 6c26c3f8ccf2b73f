import { colour, type ColouringResult } from '../../../engines/colouring/index.ts';
import { colouringRequest } from '../../../schemas/api/check-colouring.ts';
import { answered, statsSince, type Answer } from '../../api/answer.ts';
import { parseJson } from '../../api/read-json.ts';
import { faultsIn } from '../colour.work.ts';
import type { Task } from '../task-port.ts';
import { problemOfRequest } from './keyed-problem.ts';
import { colouringByKey, explanationByKey, proofByKey } from './keyed-result.ts';

/** `POST /check/colouring`, from the bytes of the body to those of the answer. */
export const checkColouringJson = ({ input }: Task<Uint8Array>): Promise<Answer> =>
	answered(async () => {
		const request = parseJson(input, colouringRequest);
		const problem = problemOfRequest(request);
		const started = performance.now();
		const result = await colour(problem);
		const stats = statsSince(started);
		const faults = await faultsIn(problem, result);
		if (faults.length > 0) throw new Error(`the checker refused a colouring: ${faults.join(' ')}`);
		return { ...byKey(request.regions, result), stats };
	});

function byKey(keys: readonly string[], result: ColouringResult): object {
	if (result.status === 'undecided') return result;
	if (result.status === 'impossible') {
		return { status: result.status, explanation: explanationByKey(keys, result.explanation) };
	}
	const { status, inksUsed, colouring, lowerBound, proof, changes, objective } = result;
	return {
		...{ status, inksUsed, lowerBound },
		colouring: colouringByKey(keys, colouring),
		proof: proofByKey(keys, proof),
		...(changes ? { changes } : {}),
		...(objective === undefined ? {} : { objective }),
	};
}
