import type { LegendPlace } from '../drawing.ts';
import type { Box } from '../plane/fit.ts';
import { planLegend, type LegendInput, type LegendPlan } from './legend-plan.ts';

/** Shares of the map's width that a legend may take, tried in turn until no name takes more than two lines. */
const besideShares = [0.14, 0.18, 0.22, 0.26, 0.3];
const cornerShares = [...besideShares, 0.36];
/** A legend that is too high is set smaller, down to this share of its type. */
const smallestType = 0.6;

/** The map's box and the legend that was taken out of it. */
export interface BesideMap {
	map: Box;
	legend: LegendPlace;
}

/** A plan that is no higher than a height, in smaller type if it must be. */
function within(input: LegendInput, size: number, shares: number[], map: Box, height: number) {
	let plan = narrowest(input, size, shares, map);
	for (let type = size; plan.height > height && type > size * smallestType;) {
		type = Math.max(Math.round(type * 0.93), 1);
		plan = narrowest(input, type, shares, map);
	}
	return plan;
}

function narrowest(input: LegendInput, size: number, shares: number[], map: Box): LegendPlan {
	let plan = planLegend(input, size, Math.round(map.width * shares[0]));
	for (const share of shares.slice(1)) {
		if (plan.lines <= 2 && plan.title.length <= 2 && plan.weak.length <= 4) break;
		plan = planLegend(input, size, Math.round(map.width * share));
	}
	return plan;
}

/** A legend in one column left or right of the map, from its upper edge down. */
export function besideMap(
	input: LegendInput,
	side: 'left' | 'right',
	map: Box,
	size: number,
): BesideMap {
	const asked = oneColumn(input);
	const plan = within(asked, size, besideShares, map, map.height);
	const air = Math.round(size * 1.6);
	const x = side === 'left' ? map.x : map.x + map.width - plan.width;
	return {
		legend: { ...plan, x, y: map.y },
		map: {
			...map,
			x: side === 'left' ? map.x + plan.width + air : map.x,
			width: map.width - plan.width - air,
		},
	};
}

/** A legend that is to stand on the map, wherever there is room. */
export const onMap = (input: LegendInput, map: Box, size: number): LegendPlan =>
	within(oneColumn(input), size, cornerShares, map, map.height * 0.7);

/** Beside and on the map names stand under one another unless columns are asked for. */
function oneColumn(input: LegendInput): LegendInput {
	const { layout } = input;
	const legendColumns = layout.collar.legendColumns ?? 1;
	return { ...input, layout: { ...layout, collar: { ...layout.collar, legendColumns } } };
}
