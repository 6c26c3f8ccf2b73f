import {
	colour,
	type ColouringProblem,
	type ColouringResult,
} from '../../engines/colouring/index.ts';

/** Colours a region graph; the milliseconds are those of the computation alone. */
export async function colourGraph({
	input,
}: {
	input: ColouringProblem;
}): Promise<{ result: ColouringResult; milliseconds: number }> {
	const started = performance.now();
	const result = await colour(input);
	return { result, milliseconds: performance.now() - started };
}
