import { isAcross, kindCode } from '$lib/engines/borders/border-list';
import type { Draft } from '$lib/engines/editions/draft';
import type { DeskColouring, DeskFinding, DeskSheet } from '$lib/schemas/desk';
import type { MarkKind } from '$lib/components/Mark.svelte';
import { count, counted, date } from '$lib/components/format';
import type { Standing } from '$lib/engines/borders/standing';
import { themeStage, type ThemeState } from './theme-words';

/** A run of the words of a stage; with `to` it leads to the place its number speaks of. */
export interface DocketWords {
	text: string;
	to?: string;
}
export interface DocketStage {
	id:
		| 'boundaries'
		| 'borders'
		| 'colours'
		| 'palette'
		| 'layout'
		| 'measures'
		| 'theme'
		| 'territories'
		| 'editions';
	title: string;
	mark: MarkKind | null;
	words: DocketWords[];
}

/** What the docket says of the territories. */
export interface TerritoryState {
	territories: number;
	torn: number;
	outside: number;
	/** the tolerance that all measures share, in words */
	tolerance: string;
	/** regions in no territory */
	without: number;
}

export interface DocketState {
	sheet: DeskSheet;
	draft: Draft;
	standing: readonly Standing[];
	/** about the graph of the borders that count */
	planar: boolean;
	answer: DeskColouring | null;
	working: boolean;
	palette: { mark: MarkKind | null; sentence: string };
	/** names of the projection drawn, and how many labels had to be listed; null until it is drawn */
	drawn: { projection: string; unplaced: number } | null;
	/** the measure that the sheet shows; null while it shows its colouring */
	theme: ThemeState | null;
	/** what the territories come to; null until it is known */
	territories: TerritoryState | null;
	/** whether the draft was saved after the last edition was issued */
	changedSinceEdition: boolean;
}

/** The stages in the order the work flows, each with its state in words and numbers. */
export const docket = (state: DocketState): DocketStage[] => [
	{ id: 'boundaries', title: 'Boundaries', ...boundaries(state) },
	{ id: 'borders', title: 'Borders', ...borders(state) },
	{ id: 'colours', title: 'Colours', ...colours(state) },
	{
		id: 'palette',
		title: 'Palette',
		mark: state.working ? null : state.palette.mark,
		words: [
			state.working
				? { text: 'Waiting for the colouring' }
				: { text: state.palette.sentence, to: '#verdict' },
		],
	},
	{ id: 'layout', title: 'Layout', ...layout(state) },
	...measures(state.sheet),
	themeStage(state.theme),
	...territories(state),
	{ id: 'editions', title: 'Editions', ...editions(state) },
];

type Said = Pick<DocketStage, 'mark' | 'words'>;

/** Notes only tell; errors and warnings stay open until somebody accepts them. */
export const isOpen = ({ severity, acceptedAt }: DeskFinding): boolean =>
	severity !== 'note' && acceptedAt === null;

function boundaries({ sheet, draft }: DocketState): Said {
	const open = sheet.findings.filter(isOpen);
	const worst = open.some(({ severity }) => severity === 'error')
		? 'error'
		: open.some(({ severity }) => severity === 'warning')
			? 'warning'
			: 'clear';
	const groups = new Set(sheet.regions.group.filter((group) => group !== null)).size;
	const regions = counted(sheet.boundarySet.regionCount, 'region');
	const column = draft.layout.groupColumn;
	const within = groups > 1 && column ? ` in ${count(groups)} groups by ${column}` : '';
	return {
		mark: worst,
		words: [
			{ text: regions, to: '#regions' },
			{ text: `${within}.` },
			open.length
				? {
						text: `${counted(open.length, 'finding')} open${worst === 'error' ? '' : ', no errors'}`,
						to: '#findings',
					}
				: { text: 'No findings open' },
		],
	};
}

function borders({ sheet, draft, standing, planar }: DocketState): Said {
	const { kind } = sheet.borders;
	const of = (found: (code: number) => boolean) =>
		kind.reduce((sum, code) => sum + Number(found(code)), 0);
	const are = (one: Standing) => standing.reduce((sum, each) => sum + Number(each === one), 0);
	const points = of((code) => code === kindCode('point'));
	const [short, struck] = [are('too-short'), are('struck')];
	const across = standing.reduce(
		(sum, one, border) => sum + Number(one === 'counts' && isAcross(kind[border])),
		0,
	);
	const parts = [
		`${count(of((code) => code === kindCode('line')))} by line`,
		short ? `${count(short)} of them too short to count` : '',
		points ? `${count(points)} by point${draft.pointTouches ? '' : ' (not counted)'}` : '',
		across ? `${count(across)} across water` : '',
		struck ? `${count(struck)} struck out` : '',
		draft.added.length ? `${count(draft.added.length)} added by hand` : '',
	];
	const words: DocketWords[] = [
		{ text: parts.filter(Boolean).join(', '), to: '#borders' },
		{ text: '.' },
	];
	if (!planar) words.push({ text: 'Four inks not guaranteed', to: '#planar' });
	return { mark: 'clear', words };
}

function colours({ answer, draft, working }: DocketState): Said {
	const locks = Object.keys(draft.locks).length;
	const held = locks ? { text: `${counted(locks, 'lock')}`, to: '#locks' } : { text: 'No locks' };
	if (working) return { mark: null, words: [{ text: 'Colouring now.' }, held] };
	if (!answer) return { mark: null, words: [{ text: 'Not coloured yet.' }, held] };
	if (answer.status === 'impossible') {
		const { locks: colliding } = answer.explanation;
		const what = colliding.length ? collision(colliding.length) : 'The rules collide';
		return { mark: 'error', words: [{ text: what, to: '#because' }, { text: '.' }, held] };
	}
	if (answer.status === 'undecided')
		return { mark: 'warning', words: [{ text: 'Undecided', to: '#because' }, { text: '.' }, held] };
	return {
		mark: 'clear',
		words: [
			{ text: `${counted(answer.inksUsed, 'ink')},` },
			{ text: boundWords(answer), to: '#because' },
			{ text: '.' },
			held,
		],
	};
}

const collision = (locks: number) =>
	locks === 1 ? '1 lock cannot be kept' : `${count(locks)} locks collide`;

function layout({ draft: { layout: sheet }, drawn }: DocketState): Said {
	const paper =
		typeof sheet.paper === 'string'
			? `${sheet.paper} ${sheet.orientation}`
			: `${sheet.paper.widthMm} by ${sheet.paper.heightMm} mm`;
	const words: DocketWords[] = [{ text: drawn ? `${paper}, ${drawn.projection}.` : `${paper}.` }];
	if (drawn && sheet.labels)
		words.push(
			drawn.unplaced
				? { text: `${counted(drawn.unplaced, 'name')} not placed`, to: '#labels' }
				: { text: 'Every name placed' },
		);
	return { mark: drawn ? 'clear' : null, words };
}

function measures({ measures: held }: DeskSheet): DocketStage[] {
	if (!held) return [];
	const { count: measured, missing, stale, open } = held;
	const words: DocketWords[] = measured
		? [{ text: counted(measured, 'measure'), to: '#measures' }, { text: '.' }]
		: [{ text: open ? 'None joined yet.' : 'None joined yet' }];
	if (stale) words.push({ text: 'Joined to earlier boundaries', to: '#tables' });
	else if (missing) words.push({ text: `${counted(missing, 'value')} missing`, to: '#measures' });
	if (open && words.length > 2) words.push({ text: '.' });
	if (open) words.push({ text: `${counted(open, 'table')} under review`, to: '#tables' });
	const mark = stale ? 'error' : missing ? 'warning' : measured ? 'clear' : null;
	return [{ id: 'measures', title: 'Measures', mark, words }];
}

function editions({ sheet, changedSinceEdition }: DocketState): Said {
	const [last] = sheet.editions;
	if (!last) return { mark: null, words: [{ text: 'None issued yet' }] };
	return {
		mark: 'clear',
		words: [
			{ text: `${counted(sheet.editions.length, 'edition')} issued`, to: '#editions' },
			{ text: `, last on ${date(last.issuedAt)}.` },
			...(changedSinceEdition ? [{ text: 'The draft has changed since' }] : []),
		],
	};
}

function territories({ sheet, territories: known }: DocketState): DocketStage[] {
	if (!sheet.rights.includes('measures.read')) return [];
	const stage = { id: 'territories', title: 'Territories' } as const;
	if (!known) return [{ ...stage, mark: null, words: [] }];
	if (!known.territories) return [{ ...stage, mark: null, words: [{ text: 'None yet' }] }];
	const { torn, outside, without } = known;
	const wrong: DocketWords[] = [
		...(torn ? [{ text: `${count(torn)} torn`, to: '#torn' }] : []),
		...(outside ? [{ text: `${count(outside)} outside ${known.tolerance}`, to: '#list' }] : []),
		...(without ? [{ text: `${counted(without, 'region')} in none`, to: '#without' }] : []),
	];
	const words = [
		{ text: counted(known.territories, 'territory', 'territories'), to: '#list' },
		...wrong.flatMap((part) => [{ text: ', ' }, part]),
		{ text: '.' },
	];
	const mark = torn || outside ? 'error' : without ? 'warning' : 'clear';
	return [{ ...stage, mark, words }];
}

function boundWords(answer: Extract<DeskColouring, { status: 'coloured' }>): string {
	if (answer.proof.kind !== 'not-proved') return 'proved fewest';
	const { lowerBound, inksUsed } = answer;
	return lowerBound < inksUsed ? `at least ${lowerBound} needed` : 'no proof to show';
}
