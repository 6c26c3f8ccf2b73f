import type { ColouringProblem } from '../../../engines/colouring/index.ts';
import { problemFaults } from '../../../engines/colouring/index.ts';
import { groupPairs } from '../../../engines/editions/group-pairs.ts';
import type { ColouringRequest } from '../../../schemas/api/check-colouring.ts';
import { ApiFault } from '../../api/fault.ts';

/** The problem of a request, regions by number in the order given. Names what does not fit. */
export function problemOfRequest(request: ColouringRequest): ColouringProblem {
	const numbers = numbered(request.regions);
	const number = lookUp(numbers);
	const pairs = (name: 'borders' | 'alike' | 'apart') =>
		request[name].map(([a, b], place) => {
			const at = `${name}.${place}`;
			if (a === b) throw malformed(at, `"${a}" is paired with itself`);
			return [number(a, at), number(b, at)] as const;
		});
	const borders = pairs('borders');
	request.groups.forEach(({ keys }, group) =>
		keys.forEach((key, place) => number(key, `groups.${group}.keys.${place}`)),
	);
	const groups = groupPairs(request.groups, numbers);
	const column = <T extends Int32Array | Float64Array>(
		name: 'locks' | 'lockCosts' | 'previous' | 'areas',
		values: T,
	) => {
		for (const [key, value] of Object.entries(request[name] ?? {})) {
			values[number(key, `${name}.${key}`)] = value;
		}
		return values;
	};
	const count = request.regions.length;
	const problem: ColouringProblem = {
		regions: count,
		borders: {
			a: Uint32Array.from(borders, ([a]) => a),
			b: Uint32Array.from(borders, ([, b]) => b),
		},
		inks: request.inks,
		locks: column('locks', new Int32Array(count).fill(-1)),
		lockCosts: column('lockCosts', new Float64Array(count).fill(1)),
		forbidden: Object.entries(request.forbidden).flatMap(([key, inks]) =>
			inks.map((ink) => [number(key, `forbidden.${key}`), ink] as const),
		),
		reserved: request.reserved,
		alike: [...pairs('alike'), ...groups.alike],
		apart: [...pairs('apart'), ...groups.apart],
		goal: request.goal,
		seed: request.seed,
		effort: request.effort,
		...(request.previous ? { previous: column('previous', new Int32Array(count).fill(-1)) } : {}),
		...(request.areas ? { areas: column('areas', new Float64Array(count)) } : {}),
		...(request.lengths ? { lengths: request.lengths } : {}),
		...(request.inkDistances ? { inkDistances: request.inkDistances } : {}),
	};
	const faults = problemFaults(problem);
	if (faults.length === 0) return problem;
	throw new ApiFault(400, 'malformed', faults[0], { issues: faults.slice(0, 20) });
}

function numbered(regions: readonly string[]): Map<string, number> {
	const numbers = new Map<string, number>();
	regions.forEach((key, place) => {
		if (numbers.has(key)) throw malformed(`regions.${place}`, `"${key}" is there twice`);
		numbers.set(key, place);
	});
	return numbers;
}

const lookUp =
	(numbers: ReadonlyMap<string, number>) =>
	(key: string, at: string): number => {
		const found = numbers.get(key);
		if (found === undefined) throw malformed(at, `there is no region "${key}"`);
		return found;
	};

const malformed = (path: string, message: string) =>
	new ApiFault(400, 'malformed', `${path}: ${message}`, { issues: [{ path, message }] });
