import { rebalance } from '../../../engines/territories/index.ts';
import { territoriesRequest } from '../../../schemas/api/check-territories.ts';
import { answered, statsSince, type Answer } from '../../api/answer.ts';
import { parseJson } from '../../api/read-json.ts';
import { faultsOf } from '../rebalance.work.ts';
import type { Task } from '../task-port.ts';
import { rebalanceByKey } from './keyed-plan.ts';
import { problemOfRequest } from './keyed-territories.ts';

/** `POST /check/territories`, from the bytes of the body to those of the answer. */
export const checkTerritoriesJson = ({ input }: Task<Uint8Array>): Promise<Answer> =>
	answered(async () => {
		const request = parseJson(input, territoriesRequest);
		const asked = problemOfRequest(request);
		const started = performance.now();
		const result = 'missing' in asked ? asked.missing : await rebalance(asked.problem);
		const stats = statsSince(started);
		const faults = 'missing' in asked ? [] : faultsOf(asked.problem, result);
		if (faults.length > 0) throw new Error(`the checker refused a plan: ${faults.join(' ')}`);
		const keys = {
			units: request.units.map(({ key }) => key),
			territories: request.territories.map(({ key }) => key),
			measures: 'missing' in asked ? [] : asked.problem.measures.map(({ name }) => name),
		};
		return { ...rebalanceByKey(keys, result), stats };
	});
