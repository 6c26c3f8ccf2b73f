import loadHighs from 'highs';
import type { ColouringProblem } from '../../src/lib/engines/colouring/problem.ts';

/**
 * What the cheapest release of locks costs, by one plain integer program through HiGHS (npm highs): one
 * binary variable for each region and ink, every rule a row, the weight of the locks kept maximised.
 * Null when the rules cannot be kept even without locks. The number of inks must be given.
 */
export async function plainRelease(problem: ColouringProblem): Promise<number | null> {
	const inks = Array.from({ length: Number(problem.inks) }, (_, ink) => ink);
	const name = (region: number, ink: number) => `x${region}_${ink}`;
	const regions = Array.from({ length: problem.regions }, (_, region) => region);
	const weights = lockWeights(problem);
	const held = [...weights].filter(([{ ink }]) => ink < inks.length);
	const wanted = held.map(([{ region, ink }, weight]) => `${weight} ${name(region, ink)}`);
	const rows = [
		...regions.map((r) => `${inks.map((ink) => name(r, ink)).join(' + ')} = 1`),
		...pairsThatDiffer(problem).flatMap(([a, b]) =>
			inks.map((ink) => `${name(a, ink)} + ${name(b, ink)} <= 1`),
		),
		...(problem.alike ?? []).flatMap(([a, b]) =>
			a === b ? [] : inks.map((ink) => `${name(a, ink)} - ${name(b, ink)} = 0`),
		),
		...(problem.forbidden ?? [])
			.filter(([, ink]) => ink < inks.length)
			.map(([region, ink]) => `${name(region, ink)} = 0`),
	];
	const text = ['Maximize', ` ${wanted.join('\n + ') || `0 ${name(0, 0)}`}`, 'Subject To', ...rows];
	const names = regions.flatMap((r) => inks.map((ink) => ` ${name(r, ink)}`));
	const options = { output_flag: false, time_limit: 60, mip_rel_gap: 0 };
	const highs = await loadHighs();
	const result = highs.solve([...text, 'Binary', ...names, 'End'].join('\n'), options);
	if (result.Status !== 'Optimal') return null;
	return [...weights.values()].reduce((sum, weight) => sum + weight, 0) - result.ObjectiveValue;
}

function lockWeights({ locks, lockCosts }: ColouringProblem) {
	const weights = new Map<{ region: number; ink: number }, number>();
	locks?.forEach((ink, region) => {
		if (ink >= 0) weights.set({ region, ink }, lockCosts?.[region] ?? 1);
	});
	return weights;
}

function pairsThatDiffer({ borders, apart }: ColouringProblem): [number, number][] {
	const listed = Array.from(borders.a, (a, i): [number, number] => [a, borders.b[i]]);
	return [...listed, ...(apart ?? []).map(([a, b]): [number, number] => [a, b])];
}
