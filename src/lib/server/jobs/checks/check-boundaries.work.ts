import {
	readBoundaries,
	type BoundariesResult,
	type BoundaryOptions,
	type Coverage,
} from '../../../engines/boundaries/index.ts';
import { borderKinds, type BorderList } from '../../../engines/borders/index.ts';
import { buildGraph, isPlanar } from '../../../engines/graph/index.ts';
import { answered, statsSince, type Answer } from '../../api/answer.ts';
import { ApiFault } from '../../api/fault.ts';
import { fileSource } from '../file-source.ts';
import type { Task } from '../task-port.ts';

export interface CheckBoundariesInput {
	path: string;
	fileName: string;
	options: BoundaryOptions;
}

/** `POST /check/boundaries`, from a received file to the bytes of the answer. */
export const checkBoundariesFile = ({ input }: Task<CheckBoundariesInput>): Promise<Answer> =>
	answered(async () => {
		const started = performance.now();
		const result = await readBoundaries(fileSource(input.path, input.fileName), input.options);
		if (result.status === 'cancelled') throw new Error('reading ended without being asked to');
		if (result.status === 'refused') {
			const details = { findings: result.findings };
			throw new ApiFault(422, result.code, result.message, details);
		}
		const found = byKey(result);
		return { ...found, stats: statsSince(started) };
	});

type Accepted = Extract<BoundariesResult, { status: 'accepted' }>;

const byKey = ({ coverage, borders, findings, source }: Accepted) => ({
	regions: regionRows(coverage),
	borders: borderRows(coverage.keys, borders),
	planar: isLinePlanar(coverage.keys.length, borders),
	findings: findings.map(({ code, severity, message, regions, at }) => ({
		...{ code, severity, message, regions, at },
	})),
	source,
});

const regionRows = ({ keys, names, regionParts, areasKm2, enclaveOf }: Coverage) =>
	keys.map((key, region) => ({
		key,
		name: names[region],
		parts: regionParts[region + 1] - regionParts[region],
		areaKm2: areasKm2[region],
		enclaveOf: enclaveOf[region] < 0 ? null : keys[enclaveOf[region]],
	}));

/** In each pair the key that comes first by code units stands first, as everywhere in the API. */
export const borderRows = (keys: readonly string[], { a, b, kind, metres }: BorderList) =>
	Array.from(a, (_, i) => {
		const [one, two] = [keys[a[i]], keys[b[i]]];
		const [first, second] = one < two ? [one, two] : [two, one];
		return { a: first, b: second, kind: borderKinds[kind[i]], metres: metres[i] };
	});

function isLinePlanar(regions: number, { a, b, kind }: BorderList): boolean {
	const line = borderKinds.indexOf('line');
	const isLine = (_: number, i: number) => kind[i] === line;
	return isPlanar(buildGraph(regions, a.filter(isLine), b.filter(isLine)));
}
