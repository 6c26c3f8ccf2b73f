import type { TemplateDifference } from '$lib/engines/sheet/layout/template';
import type { AlikeResult, SeriesSheet } from '$lib/schemas/template';
import { counted } from '../../format';

/** Fields of a layout in the words of the layout stage; one without words is told by its own name. */
const words: Record<string, string> = {
	paper: 'paper',
	orientation: 'orientation',
	marginMm: 'margin, mm',
	projection: 'projection',
	labels: 'names on the map',
	legend: 'legend',
	scaleBar: 'scale bar',
	credits: 'credits',
	palette: 'palette',
	'frame.ratio': 'ratio, one to',
	'frame.insets': 'insets',
	'frame.graticule': 'graticule',
	'frame.northArrow': 'north arrow',
	'frame.neatLine': 'line round the map',
	'frame.sea': 'sea',
	'frame.lakes': 'lakes',
	'lettering.priority': 'which names come first',
	'lettering.sizePt': 'size of names, points',
	'lettering.groupSizePt': 'size of the names above, points',
	'lettering.groupNames': 'names of the level above',
	'lettering.numbers': 'numbers and a list',
	'lines.outer': 'outer boundary',
	'lines.group': 'lines of the level above',
	'lines.region': 'lines of regions',
	'lines.doubleWeak': 'double lines',
	'collar.legendAt': 'place of the legend',
	'collar.legendColumns': 'columns of the legend',
	'collar.legendOrder': 'order of the legend',
	'collar.legendCounts': 'regions of each ink',
	'collar.legendLines': 'lines in the legend',
	'collar.lineNames': 'words for lines',
};

export const fieldWords = (field: string): string => words[field] ?? field.replace(/^.*\./, '');

/** A value in words: what is not set suits the sheet, a line is its width, colour and dashes. */
export function valueWords(value: unknown): string {
	if (value === null || value === undefined) return 'as suits the sheet';
	if (typeof value === 'boolean') return value ? 'yes' : 'no';
	if (Array.isArray(value)) return value.length ? value.map(valueWords).join(' ') : 'none';
	if (typeof value === 'object') {
		const parts = Object.entries(value).filter(([, part]) => part !== '');
		return parts.map(([, part]) => valueWords(part)).join(', ') || 'as usual';
	}
	const text = String(value);
	return text === '' ? 'none' : text.length > 60 ? `${text.slice(0, 60)}…` : text;
}

export const differenceWords = ({ field, now, template }: TemplateDifference): string =>
	`${fieldWords(field)}: ${valueWords(now)}, by the template ${valueWords(template)}`;

export const sheetWords = ({ differs }: SeriesSheet): string =>
	differs.length
		? `differs in ${differs.map(({ field }) => fieldWords(field)).join('; ')}`
		: 'as the template says';

/** What became of the sheets that were to be set alike. */
export function alikeWords(results: readonly AlikeResult[]): string {
	const of = (outcome: AlikeResult['outcome']) => results.filter((one) => one.outcome === outcome);
	const set = of('set').length;
	const stale = of('stale').map(
		({ number, by }) =>
			`sheet ${number} was saved by ${by ?? 'somebody else'} meanwhile and stays as it is`,
	);
	const gone = of('gone').map(({ number }) => `sheet ${number} is no longer there`);
	const head = set ? `${counted(set, 'sheet')} set alike` : 'No sheet was changed';
	return `${[head, ...stale, ...gone].join('; ')}.`;
}
