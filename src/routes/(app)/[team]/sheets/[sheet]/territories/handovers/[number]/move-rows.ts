import { filtered, ordered, type Column } from '$lib/components/table';
import type { Handover, HandoverMove } from '$lib/schemas/handover';

/** The moves of a list as its address asks for them: in which order, which of them, which page. */

export interface Asked {
	sort: string;
	down: boolean;
	state: string;
	territory: string;
	words: string;
	/** counts from 1; 0: all on one page, as for printing */
	page: number;
}

export interface MoveColumn extends Column<HandoverMove> {
	/** name of the measure it shows */
	measure?: string;
}

const pageLength = 100;

export const columnsOf = ({ measures }: Pick<Handover, 'measures'>): MoveColumn[] => [
	{ id: 'region', label: 'Region', value: ({ region }) => region.name },
	{ id: 'from', label: 'From', value: ({ from }) => from?.name ?? null },
	{ id: 'to', label: 'To', value: ({ to }) => to.name },
	...measures.map(({ name, unit }, place) => ({
		...{ id: `measure-${place}`, label: name, measure: name, numeric: true },
		value: ({ figures }: HandoverMove) => figures[name] ?? null,
		...(unit ? { label: `${name}, ${unit}` } : {}),
	})),
	{ id: 'reason', label: 'Reason', value: ({ reason }) => reason },
	{ id: 'state', label: 'State', value: ({ state }) => state },
	{ id: 'word', label: 'Word', value: ({ word, by }) => `${word} ${by}`.trim() || null },
];

export function askedOf(query: URLSearchParams): Asked {
	const page = Number(query.get('page') ?? 1);
	return {
		sort: query.get('sort') ?? '',
		down: query.has('down'),
		state: query.get('state') ?? '',
		territory: query.get('territory') ?? '',
		words: (query.get('words') ?? '').slice(0, 200),
		page: Number.isSafeInteger(page) && page >= 0 ? page : 1,
	};
}

/** The address of the same moves asked for otherwise; without a page it begins at the first. */
export function addressOf(asked: Asked, change: Partial<Asked>): string {
	const { sort, down, state, territory, words, page } = { ...asked, page: 1, ...change };
	const query = new URLSearchParams();
	if (sort) query.set('sort', sort);
	if (sort && down) query.set('down', '');
	if (state) query.set('state', state);
	if (territory) query.set('territory', territory);
	if (words) query.set('words', words);
	if (page !== 1) query.set('page', String(page));
	return `?${query}#moves`;
}

export function movesAsked(list: Pick<Handover, 'measures' | 'moves'>, asked: Asked) {
	const columns = columnsOf(list);
	const { territory, state } = asked;
	const matching = list.moves.filter(
		(move) =>
			(!state || move.state === state) &&
			(!territory || move.to.key === territory || move.from?.key === territory),
	);
	const order = asked.sort ? { id: asked.sort, down: asked.down } : null;
	const rows = ordered(filtered(matching, columns, asked.words), columns, order);
	const pages = Math.max(1, Math.ceil(rows.length / pageLength));
	const page = Math.min(asked.page, pages);
	const from = (page - 1) * pageLength;
	return {
		rows: page === 0 ? rows : rows.slice(from, from + pageLength),
		found: rows.length,
		pages: page === 0 ? 1 : pages,
		page,
	};
}
