import { goalFigures } from '$lib/engines/colouring/goal-figures';
import { Improver } from '$lib/engines/colouring/improve';
import type { ImproveAsk, ImproveNews } from '$lib/state/improving.svelte';

/** A slice takes about this long; steps are what is counted, so their number follows the machine. */
const sliceMs = 120;
const firstSteps = 20_000;
/** How often the page is told; and how often it is sent a colouring, which it has to paint. */
const tellMs = 250;
const paintMs = 500;
const paintLargeMs = 2_500;
const large = 5_000;

/**
 * Improves one colouring until it is ended or nothing is left to gain. In: the problem, the colouring to
 * start from and the goals. Out: several times a second where every goal stands and how many steps were
 * taken, with the best colouring when it is another.
 */
self.onmessage = ({ data }: MessageEvent<ImproveAsk>) => {
	try {
		const { problem, colouring, wishes, inks, seed } = data;
		go(new Improver(problem, colouring, wishes, { inks, seed }), data);
	} catch (error) {
		tell({ failed: error instanceof Error ? error.message : String(error) });
	}
};

const tell = (news: ImproveNews) => self.postMessage(news);

function go(improver: Improver, { problem, colouring, wishes, inks }: ImproveAsk) {
	const figuresOf = (ink: Int32Array) => goalFigures(problem, ink, wishes, inks);
	const between = problem.regions > large ? paintLargeMs : paintMs;
	let steps = firstSteps;
	let sent = { version: 0, at: -Infinity };
	let told = 0;
	tell({ before: figuresOf(colouring) });
	const better = () => {
		const best = improver.best;
		sent = { version: improver.version, at: performance.now() };
		return { best, figures: figuresOf(best) };
	};
	const slice = () => {
		const started = performance.now();
		try {
			improver.run(steps);
		} catch (error) {
			return tell({ failed: error instanceof Error ? error.message : String(error) });
		}
		const now = performance.now();
		// the first slice holds what is computed once, and says nothing about the pace
		if (told) steps = paced(steps, now - started);
		if (improver.ended || now - told > tellMs) {
			told = now;
			const { steps: taken, done, ended, version } = improver;
			const due = version > sent.version && (ended || now - sent.at > between);
			tell({
				...{ steps: taken, done, ended, weakest: weakestOf(improver) },
				found: due ? better() : null,
			});
		}
		if (!improver.ended) setTimeout(slice);
	};
	slice();
}

const paced = (steps: number, milliseconds: number) =>
	Math.round(steps * Math.min(4, Math.max(0.25, sliceMs / Math.max(1, milliseconds))));

function weakestOf({ weakest }: Improver) {
	if (!weakest) return null;
	const { a, b, distance, avoidable } = weakest;
	return { a, b, distance, avoidable };
}
