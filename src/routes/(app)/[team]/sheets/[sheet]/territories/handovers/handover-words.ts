import type { MarkKind } from '$lib/components/Mark.svelte';
import type { HandoverNote } from '$lib/schemas/desk-territories';
import type { HandoverMove } from '$lib/schemas/handover';
import { counted, date } from '$lib/components/format';

/** States of lists and moves in words, each with its mark. */

export const moveMarks: Record<HandoverMove['state'], MarkKind | null> = {
	proposed: null,
	accepted: 'clear',
	disputed: 'error',
	approved: 'clear',
};

type Note = Pick<
	HandoverNote,
	'state' | 'approvedAt' | 'approvedBy' | 'proposed' | 'accepted' | 'disputed' | 'stale'
>;

export function listState(note: Note): { mark: MarkKind | null; words: string } {
	if (note.state === 'withdrawn') return { mark: null, words: 'Withdrawn' };
	if (note.state === 'approved') {
		const by = note.approvedBy ? ` by ${note.approvedBy}` : '';
		return { mark: 'clear', words: `Approved${by} on ${date(note.approvedAt ?? '')}` };
	}
	const mark = note.disputed ? 'error' : note.stale || note.proposed ? 'warning' : 'clear';
	return { mark, words: answersInWords(note) };
}

/** "3 accepted, 1 disputed, 14 not answered" */
export function answersInWords({ accepted, disputed, proposed }: Note): string {
	const parts = [
		accepted ? `${accepted} accepted` : '',
		disputed ? `${disputed} disputed` : '',
		proposed ? `${proposed} not answered` : '',
	];
	return parts.filter(Boolean).join(', ');
}

const figure = new Intl.NumberFormat('en-GB', { maximumFractionDigits: 1 });

export const figureText = (value: number | undefined): string =>
	value === undefined ? '' : figure.format(value);

/** +117 or −38.5, with a true minus */
export const signed = (value: number | undefined): string =>
	value === undefined
		? ''
		: value > 0
			? `+${figure.format(value)}`
			: figure.format(value).replace('-', '\u2212');

export const withUnit = ({ name, unit }: { name: string; unit: string }): string =>
	unit ? `${name}, ${unit}` : name;

export const movesInWords = (moves: number): string => counted(moves, 'move');
