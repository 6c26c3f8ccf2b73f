import { areaText } from '../area-text.ts';
import type { Mend } from './mend.ts';
import { isInPart, partsKm2, type Part } from './parts.ts';
import { never, type Bench, type Outcome } from './step.ts';
import { listed } from '../words.ts';

type Step<Kind extends Mend['kind']> = Extract<Mend, { kind: Kind }>;

/** Gives nobody's land at a place to a region beside it. */
export function fill({ at, into }: Step<'fill'>, { draft, keys }: Bench): Outcome {
	const region = draft.region(into);
	if (region === null) return never(`there is no region ${into} any more`);
	const { holes } = draft.matched;
	const number = holes.findIndex(({ rings }) => isInPart(rings, at));
	if (number < 0) return { why: 'the place is not a hole between regions', later: true };
	if (draft.filled.has(number)) return never('an earlier step gave it away');
	const { regions, rings, km2 } = holes[number];
	if (regions.some((r) => draft.shrunk.has(r))) {
		return { why: 'the regions around it have changed', later: true };
	}
	if (!regions.includes(region)) return never(`${into} does not lie beside it`);
	draft.filled.add(number);
	draft.redraw(region, [...draft.parts(region), rings]);
	const between = listed(regions.map((r) => keys[r]));
	const done = `Gave ${areaText(km2)} that belonged to nobody, between ${between}, to ${into}.`;
	return { done, at, regions: [into] };
}

/** Leaves a stray part out of a region, or gives it to another. */
export function part({ key, at, into }: Step<'part'>, { draft }: Bench): Outcome {
	const region = draft.region(key);
	if (region === null) return never(`there is no region ${key} any more`);
	const taker = into === null ? null : draft.region(into);
	if (into !== null && taker === null) return never(`there is no region ${into} any more`);
	if (taker === region) return never('a part cannot be given to its own region');
	if (draft.isRedrawn(region)) return { why: `${key} has changed`, later: true };
	const parts = draft.parts(region);
	const number = parts.findIndex((rings) => isInPart(rings, at));
	if (number < 0) return never(`no part of ${key} lies there`);
	if (parts.length === 1) return never(`${key} has no other part`);
	const size = areaText(partsKm2([parts[number]]));
	draft.redraw(region, withoutPart(parts, number));
	draft.shrunk.add(region);
	if (taker === null) {
		return { done: `Left out a part of ${key} of ${size}.`, at, regions: [key] };
	}
	draft.redraw(taker, [...draft.parts(taker), parts[number]]);
	return {
		done: `Gave a part of ${key} of ${size} to ${into}.`,
		at,
		regions: [key, into as string],
	};
}

const withoutPart = (parts: Part[], number: number) => parts.filter((_, i) => i !== number);
