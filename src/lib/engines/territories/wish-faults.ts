import type { TerritoryGround } from './problem-of-draft.ts';
import type { TerritoryDraft, Wishes } from './territory-draft.ts';

/** Why a rebalance cannot be asked for as it is wished. */
export interface WishFault {
	code: 'no-territory' | 'nothing-wished' | 'unknown-measure' | 'unusable-cost';
	message: string;
	/** regions by number, for a cost that is missing or below 0 */
	regions: number[];
}

/** Everything that keeps wishes from being put to the engine; empty when they can be. */
export function wishFaults(
	ground: TerritoryGround,
	draft: Pick<TerritoryDraft, 'territories'>,
	wishes: Wishes,
): WishFault[] {
	return [
		...nobodyStays(draft),
		...nothingWished(wishes),
		...unknownMeasures(ground, wishes),
		...unusableCost(ground, wishes),
	];
}

const nobodyStays = ({ territories }: Pick<TerritoryDraft, 'territories'>): WishFault[] =>
	territories.some(({ closing }) => !closing)
		? []
		: [fault('no-territory', 'There is no territory that stays. Add one first.')];

const nothingWished = ({ goal, tolerances }: Wishes): WishFault[] =>
	goal === 'least-deviation' && Object.keys(tolerances).length === 0
		? [fault('nothing-wished', 'For the least deviation, set a tolerance for a measure.')]
		: [];

function unknownMeasures({ measures }: TerritoryGround, wishes: Wishes): WishFault[] {
	const named = [...Object.keys(wishes.tolerances), wishes.cost].filter((id) => id !== 'units');
	const unknown = named.filter((id) => !measures.some((column) => column.id === id));
	if (unknown.length === 0) return [];
	const message =
		'A measure that was chosen is not joined to this boundary set any more. Choose again.';
	return [fault('unknown-measure', message)];
}

function unusableCost({ measures }: TerritoryGround, { cost }: Wishes): WishFault[] {
	const column = measures.find(({ id }) => id === cost);
	if (!column) return [];
	const regions = column.values.flatMap((value, region) =>
		value !== null && value >= 0 && value < Infinity ? [] : [region],
	);
	if (regions.length === 0) return [];
	const count = regions.length === 1 ? 'One region has' : `${regions.length} regions have`;
	const message = `${count} no figure of 0 or more for ${column.name}, so moves cannot be counted by it.`;
	return [{ code: 'unusable-cost', message, regions }];
}

const fault = (code: WishFault['code'], message: string): WishFault => ({
	...{ code, message },
	regions: [],
});
