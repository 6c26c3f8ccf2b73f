import { areaText } from '../area-text.ts';
import type { Mend } from './mend.ts';
import { boxesMeet, partsKm2, pointsIn, type Part } from './parts.ts';
import { crossesTooOften } from './self-crossings.ts';
import {
	mostCorners,
	mostCrossings,
	mostOwnCrossings,
	never,
	type Bench,
	type Outcome,
} from './step.ts';

type Step<Kind extends Mend['kind']> = Extract<Mend, { kind: Kind }>;

/** Leaves what two regions both cover with one of them, and cuts it from the other. */
export function settle(step: Step<'settle'>, bench: Bench): Outcome {
	const { draft, clip } = bench;
	const loser = step.keep === step.a ? step.b : step.a;
	if (step.keep !== step.a && step.keep !== step.b) {
		return never(`${step.keep} is neither ${step.a} nor ${step.b}`);
	}
	const [kept, cut] = [draft.region(step.keep), draft.region(loser)];
	if (kept === null) return never(`there is no region ${step.keep} any more`);
	if (cut === null) return never(`there is no region ${loser} any more`);
	const overlap = draft.matched.survey.overlaps.find(
		({ a, b }) => (a === kept && b === cut) || (a === cut && b === kept),
	);
	if (!overlap) return { why: `${step.a} and ${step.b} do not overlap`, later: true };
	const [theirs, mine] = [draft.parts(kept), draft.parts(cut)];
	const touched = mine.filter((part) => theirs.some((other) => boxesMeet(part, other)));
	const taken = theirs.filter((part) => touched.some((other) => boxesMeet(part, other)));
	if (touched.length === 0) return never(`${step.a} and ${step.b} do not overlap`);
	const spent = spend(bench, pointsIn(touched) + pointsIn(taken));
	if (spent) return never(spent);
	const knotted = knotOf(touched) ?? knotOf(taken) ?? knotOf([...touched, ...taken], mostCrossings);
	if (knotted) return never(knotted);
	const left = clip.difference(touched, taken);
	if (left === null) return never('the outlines could not be cut');
	const rest = [...mine.filter((part) => !touched.includes(part)), ...left];
	if (rest.length === 0) return never(`nothing would be left of ${loser}`);
	draft.redraw(cut, rest);
	draft.shrunk.add(cut);
	const size = areaText(overlap.km2);
	const done = `Left the ${size} that ${step.a} and ${step.b} both covered with ${step.keep} and cut it from ${loser}.`;
	return { done, at: overlap.at, regions: [step.keep, loser] };
}

/** Cuts outlines that cross themselves into parts that do not. */
export function untangle({ key }: Step<'untangle'>, bench: Bench): Outcome {
	const { draft } = bench;
	const region = draft.region(key);
	if (region === null) return never(`there is no region ${key} any more`);
	const found = draft.matched.survey.crossings.find((one) => one.region === region);
	if (!found) return { why: `the outline of ${key} does not cross itself`, later: true };
	const parts = unite(draft.parts(region), bench);
	if (typeof parts === 'string') return never(parts);
	if (parts.length === 0) return never(`nothing would be left of ${key}`);
	draft.redraw(region, parts);
	draft.shrunk.add(region);
	const done = `Cut the outline of ${key} where it crossed itself: ${countOf(parts)}, ${areaText(partsKm2(parts))} in all.`;
	return { done, at: found.at, regions: [key] };
}

/** Parts that neither cross themselves nor lie on each other, or why there are none. */
export function unite(parts: Part[], bench: Bench): Part[] | string {
	const spent = spend(bench, pointsIn(parts));
	if (spent) return spent;
	const knotted = knotOf(parts);
	if (knotted) return knotted;
	return bench.clip.untangled(parts) ?? 'the outlines could not be cut';
}

/** Why outlines are not cut, when they cross too often. */
function knotOf(parts: Part[], most = mostOwnCrossings): string | null {
	if (!crossesTooOften(parts, most)) return null;
	return `outlines that cross in more than ${most} places are not cut`;
}

const countOf = (parts: Part[]) => (parts.length === 1 ? 'one part' : `${parts.length} parts`);

/** Takes corners from what may be cut in all; answers why not when they are too many. */
function spend(bench: Bench, corners: number): string | null {
	if (corners > mostCorners) {
		return `outlines of ${corners} corners are not cut, ${mostCorners} at most`;
	}
	if (corners > bench.corners) return 'the steps before it cut as many corners as is allowed';
	bench.corners -= corners;
	return null;
}
