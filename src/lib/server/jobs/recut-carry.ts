import { carryDraft, carryInks, type Draft } from '../../engines/editions/index.ts';
import {
	decide,
	type CarriedRow as EngineRow,
	type DecideResult,
	type Decision,
	type RegionMatch,
} from '../../engines/boundaries/recut/index.ts';
import type { BorderList } from '../../engines/borders/index.ts';
import { carryNumbers, carryTexts } from '../../engines/measures/index.ts';
import { carryTerritories } from '../../engines/territories/carry-territories.ts';
import type { TerritoryDraft } from '../../engines/territories/territory-draft.ts';
import { themeRow } from './recut-theme.ts';
import type { CarriedRow, RecutDecision } from '../../schemas/recut.ts';

/** What people decided on the boundaries that stand. */
export interface Standing {
	draft: Draft;
	/** of the colouring that stands; null for none */
	inks: number[] | null;
	/** null while nobody saved any */
	territories: TerritoryDraft | null;
	measures: StandingMeasure[];
}
export interface StandingMeasure {
	id: string;
	name: string;
	values: (number | null)[] | null;
	texts: (string | null)[] | null;
}

/** The new boundaries, as far as decisions stand on them. */
export interface Fresh {
	borders: BorderList;
	/** of the attribute table */
	columns: string[];
}

export interface CarriedOver {
	draft: Draft;
	/** what the new regions would rather be coloured; -1 for anything */
	previous: Int32Array | null;
	territories: TerritoryDraft | null;
	measures: StandingMeasure[];
	report: CarriedRow[];
}

/** Everything that was decided, on the new regions, with a line for whatever follows and does not. */
export function carryOver(match: RegionMatch, standing: Standing, fresh: Fresh): CarriedOver {
	const draft = carryDraft(standing.draft, match, fresh);
	const territories = standing.territories && carryTerritories(standing.territories, match, fresh);
	const { theme } = draft.draft;
	const measures = standing.measures.map((measure) =>
		carryMeasure(measure, match, !isRate(measure, theme)),
	);
	return {
		draft: draft.draft,
		previous: standing.inks && carryInks(standing.inks, match),
		territories: territories && territories.draft,
		measures: measures.map(({ carried }) => carried),
		report: [
			...draft.rows.map((row) => toldOf('draft', row)),
			...(territories?.rows ?? []).map((row) => toldOf('territories', row)),
			...measures.map(({ row }) => row),
			...(theme ? themeRow(theme, measures, match) : []),
		],
	};
}

const toldOf = (stage: CarriedRow['stage'], row: EngineRow): CarriedRow => ({ stage, ...row });

/** Only the theme of a sheet says that a measure is a rate. */
const isRate = ({ name }: StandingMeasure, theme: Draft['theme']): boolean =>
	theme?.measure === name && theme.isRate;

/** Numbers are taken to add up where regions are merged, as counts and hours do, unless it is said of one that it is a rate. */
function carryMeasure(measure: StandingMeasure, match: RegionMatch, addsUp: boolean) {
	const numbers = measure.values && carryNumbers(measure.values, match, addsUp);
	const words = measure.texts && carryTexts(measure.texts, match);
	const { carried, summed, lost } = numbers ?? words ?? { carried: 0, summed: 0, lost: 0 };
	const told = [
		`${carried} carried over`,
		summed > 0 ? `${summed} added up from merged regions` : '',
		lost > 0
			? `${lost} regions are without one because theirs were ${addsUp ? 'split or redrawn' : 'split, redrawn or merged'}`
			: '',
	].filter((phrase) => phrase !== '');
	const row: CarriedRow = {
		...{ stage: 'measures', what: 'measure', keys: [], now: [], outcome: 'changed' },
		words: `${measure.name}: ${told.join(', ')}.`,
	};
	const { id, name } = measure;
	const carriedOn: StandingMeasure = {
		...{ id, name, values: numbers?.values ?? null, texts: words?.values ?? null },
	};
	return { carried: carriedOn, numbers, row };
}

/** The matching as people corrected it. */
export const decided = (match: RegionMatch, decisions: RecutDecision[]): DecideResult =>
	decide(match, decisions.flatMap(decisionsOf));

const decisionsOf = ({ before, after }: RecutDecision): Decision[] => {
	if (before === null) return after.map((region) => ({ kind: 'new', region }));
	return after.length === 0
		? [{ kind: 'gone', old: before }]
		: [{ kind: 'continues', old: before, as: after }];
};
