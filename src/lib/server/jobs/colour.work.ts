import { colour, type ColouringProblem, type ColouringResult } from '../../engines/colouring/index.ts';

/** Colours a region graph; the milliseconds are those of the computation alone. */
export function colourGraph({
	input,
}: {
	input: ColouringProblem;
}): { result: ColouringResult; milliseconds: number } {
	const started = performance.now();
	const result = colour(input);
	return { result, milliseconds: performance.now() - started };
}
