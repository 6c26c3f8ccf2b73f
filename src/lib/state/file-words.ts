import { exportKind, plainOptions, type ExportKindId } from '$lib/engines/exports/kinds';
import { isOpenExport, type ExportNote } from '$lib/schemas/export';
import { readerWords } from '$lib/components/desk/reader-words';

/** The kinds by what they are for, in the order in which a designer looks for them. */
export const purposes: readonly { words: string; kinds: readonly ExportKindId[] }[] = [
	{ words: 'To print', kinds: ['pdf'] },
	{ words: 'To go on drawing', kinds: ['svg', 'svgz'] },
	{ words: 'For slides and pages', kinds: ['png'] },
	{ words: 'For maps on the web and in databases', kinds: ['geojson', 'topojson', 'sld'] },
	{ words: 'Tables', kinds: ['csv', 'xlsx'] },
	{ words: 'Swatches', kinds: ['tokens', 'css'] },
	{ words: 'Several at once', kinds: ['zip'] },
];

/** Kinds that hold the drawing, and so can be drawn as another reader sees it. */
export const isDrawn = (kind: ExportKindId): boolean =>
	['pdf', 'svg', 'svgz', 'png', 'zip'].includes(kind);

/** Whether a file was asked for as it usually is. */
export const isUsual = ({ kind, reader, options }: AskedFile): boolean =>
	reader === 'typical' && unusual({ kind, options }).length === 0;

type AskedFile = Pick<ExportNote, 'kind' | 'reader' | 'options'>;

const said: Record<string, (value: unknown) => string> = {
	colours: (value) => (value === 'attribute' ? 'colours on every region' : 'colours by class'),
	letters: (value) =>
		value === 'outlines' ? 'letters as shapes' : value === 'plain' ? 'letters not carried' : '',
	dpi: (value) => `${String(value)} pixels an inch`,
	ground: (value) => (value === 'none' ? 'no paper under it' : ''),
	layers: (value) => (value === false ? 'in one layer' : ''),
	byteOrderMark: (value) => (value === false ? 'for programs' : ''),
	steps: (value) => `${Number(value).toLocaleString('en-GB')} steps`,
	kinds: (value) => (value as ExportKindId[]).map((one) => exportKind(one).words).join(', '),
};

function unusual({ kind, options }: Pick<AskedFile, 'kind' | 'options'>): string[] {
	const usual: Record<string, unknown> = { ...plainOptions[kind] };
	return Object.entries(options).flatMap(([name, value]) => {
		const words = said[name];
		if (!words || same(usual[name], value)) return [];
		return words(value) || [];
	});
}

const same = (a: unknown, b: unknown): boolean =>
	Array.isArray(a) && Array.isArray(b)
		? a.length === b.length && a.every((one) => b.includes(one))
		: a === b;

/** How a file differs from the usual one of its kind, in words; '' where it does not. */
export function differsBy({ kind, reader, options }: AskedFile): string {
	const seen = reader === 'typical' ? [] : [readerWords[reader].seen];
	return [...unusual({ kind, options }), ...seen].join(', ');
}

/**
 * Of one edition, or of the draft as it stands; those that were stopped, and those that failed and were asked
 * for again, are of no interest any more.
 */
export const filesOf = <T extends ExportNote>(
	exports: readonly T[],
	edition: number | null,
	revision: number,
): T[] =>
	exports.filter(
		(one) =>
			one.state !== 'cancelled' &&
			one.edition === edition &&
			(edition !== null || one.revision === revision) &&
			!(one.state === 'failed' && exports.some((later) => isAgain(later, one))),
	);

/** Of drafts before this one: what is there, and what is on its way. */
export const earlierFiles = <T extends ExportNote>(exports: readonly T[], revision: number): T[] =>
	exports.filter(
		(one) =>
			one.edition === null && one.revision !== revision && (one.file !== null || isOpenExport(one)),
	);

const isAgain = (later: ExportNote, one: ExportNote): boolean =>
	later.number > one.number &&
	later.state !== 'cancelled' &&
	later.edition === one.edition &&
	later.revision === one.revision &&
	later.kind === one.kind &&
	later.reader === one.reader &&
	JSON.stringify(later.options) === JSON.stringify(one.options);
