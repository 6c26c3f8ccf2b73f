import { areaText } from '../area-text.ts';
import type { Mend } from './mend.ts';
import { partsKm2, type Part } from './parts.ts';
import { unite } from './step-cuts.ts';
import { never, type Bench, type Outcome } from './step.ts';

type Step<Kind extends Mend['kind']> = Extract<Mend, { kind: Kind }>;

/** Leaves a region out. */
export function drop({ key }: Step<'drop'>, { draft }: Bench): Outcome {
	const region = draft.region(key);
	if (region === null) return never(`there is no region ${key} any more`);
	const size = areaText(partsKm2(draft.parts(region)));
	const at = cornerOf(draft.parts(region));
	draft.remove(region, null);
	return { done: `Left out ${key}, ${size}.`, at, regions: [] };
}

/** Makes a region part of another. */
export function merge({ key, into }: Step<'merge'>, bench: Bench): Outcome {
	const { draft } = bench;
	const region = draft.region(key);
	const target = draft.region(into);
	if (region === null) return never(`there is no region ${key} any more`);
	if (target === null) return never(`there is no region ${into} any more`);
	if (region === target) return never('a region cannot be joined into itself');
	const size = areaText(partsKm2(draft.parts(region)));
	const at = cornerOf(draft.parts(region));
	const both = [...draft.parts(target), ...draft.parts(region)];
	const isDouble = draft.matched.survey.overlaps.some(
		({ a, b }) => (a === region && b === target) || (a === target && b === region),
	);
	const joined = isDouble ? unite(both, bench) : both;
	if (typeof joined === 'string') return never(joined);
	draft.remove(region, target);
	draft.redraw(target, joined);
	return { done: `Joined ${key}, ${size}, into ${into}.`, at, regions: [into] };
}

const cornerOf = (parts: Part[]): [number, number] | null =>
	parts.length ? [parts[0][0][0], parts[0][0][1]] : null;
