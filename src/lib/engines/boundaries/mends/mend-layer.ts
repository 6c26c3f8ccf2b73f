import type { Finding } from '../finding.ts';
import { renumber, type Naming } from '../keys.ts';
import { matchNoded, withoutSegments, type Matched } from '../match.ts';
import { nodeOutlines } from '../node-outlines.ts';
import type { BoundaryOptions } from '../options.ts';
import { relabel } from '../relabel.ts';
import { settleParallel } from '../settle-parallel.ts';
import { applyMend, mendKeys, mendWords } from './apply.ts';
import { loadClip, type Clip } from './clip.ts';
import { Draft } from './draft.ts';
import type { Mend } from './mend.ts';
import { redrawOutlines } from './redraw.ts';
import { mostCornersInAll, type Bench } from './step.ts';

export interface Mended {
	naming: Naming;
	matched: Matched;
	/** what was mended, and what could not be */
	findings: Finding[];
}

/** The map is matched again at most so often for steps that build on earlier ones. */
const mostRounds = 8;

/**
 * Replays steps in order on a matched map and matches it again. A step whose place is only there once
 * earlier ones have been matched waits for that; one that does not apply even then changes nothing and
 * is told. A region left out or joined twice over is one step.
 */
export async function mendLayer(
	given: { naming: Naming; matched: Matched },
	options: BoundaryOptions,
	stage: (message: string, share: number) => void,
): Promise<Mended> {
	const mends = onceEach(options.mends ?? []);
	const clip = await loadClip();
	const findings: Finding[] = [];
	let { naming, matched } = given;
	let bench = benchFor(matched, clip, mostCornersInAll);
	let rounds = 0;
	const rematch = () => {
		stage('Matching what was mended', 0.85);
		({ naming, matched } = matchedAgain(bench.draft, naming, options, findings));
		bench = benchFor(matched, clip, bench.corners);
		rounds++;
	};
	for (const mend of mends) {
		let outcome = applyMend(mend, bench);
		if ('why' in outcome && outcome.later && bench.draft.isChanged && rounds < mostRounds) {
			rematch();
			outcome = applyMend(mend, bench);
		}
		if ('done' in outcome) {
			const { done: message, at, regions } = outcome;
			findings.push({ code: 'mended', severity: 'note', message, regions, at });
		} else findings.push(notApplied(mend, outcome.why));
	}
	if (bench.draft.isChanged) rematch();
	return { naming, matched, findings: aboutKnown(findings, naming.keys) };
}

/** The findings with only those regions that are still there once the map is mended. */
export function aboutKnown(findings: Finding[], keys: string[]): Finding[] {
	const known = new Set(keys);
	return findings.map((finding) => ({
		...finding,
		regions: finding.regions.filter((key) => known.has(key)),
	}));
}

const benchFor = (matched: Matched, clip: Clip, corners: number): Bench => ({
	...{ clip, corners },
	draft: new Draft(matched),
	keys: matched.coverage.keys,
});

/** Whole kinds of findings mended at once may leave out one region several times; that is one step. */
function onceEach(mends: Mend[]): Mend[] {
	const known = new Set<string>();
	return mends.filter((mend) => {
		if (mend.kind !== 'drop' && mend.kind !== 'merge') return true;
		const step = JSON.stringify(mend);
		return !known.has(step) && known.add(step);
	});
}

function notApplied(mend: Mend, why: string): Finding {
	return {
		code: 'mend-not-applied',
		severity: 'warning',
		message: `${mendWords(mend)} was not done: ${why}.`,
		regions: mendKeys(mend),
		at: 'at' in mend ? mend.at : null,
	};
}

function matchedAgain(
	draft: Draft,
	naming: Naming,
	options: BoundaryOptions,
	findings: Finding[],
): { naming: Naming; matched: Matched } {
	const { keys } = draft.matched.coverage;
	const outcome = draft.outcome();
	const noded = nodeOutlines(redrawOutlines(draft.matched.noded.outlines, draft));
	settleParallel(noded.segments);
	for (const region of withoutSegments(noded, keys.length)) {
		if (outcome[region] !== region) continue;
		const message = `Nothing is left of ${keys[region]} once the map is mended, so it was left out.`;
		findings.push({ code: 'no-area', severity: 'warning', message, regions: [], at: null });
		outcome[region] = -1;
	}
	const { renamed, numbers } = renumber(naming, outcome);
	const labelled = relabel(noded, numbers, renamed.keys.length);
	return {
		naming: renamed,
		matched: matchNoded(labelled, renamed.keys, renamed.names, options),
	};
}
