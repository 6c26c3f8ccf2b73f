import { createHash } from 'node:crypto';
import { canonicalJson } from '../../engines/editions/index.ts';
import type { Row } from '../database/schema.ts';
import type { HandoverRow } from '../repositories/handovers.repository.ts';

type Head = Pick<
	HandoverRow,
	| 'number'
	| 'proposal_number'
	| 'proposal_name'
	| 'effective_on'
	| 'note'
	| 'measures'
	| 'data_digest'
>;
type Move = Pick<
	Row<'handover_moves'>,
	| 'ordinal'
	| 'region_key'
	| 'region_name'
	| 'from_key'
	| 'from_name'
	| 'to_key'
	| 'to_name'
	| 'figures'
	| 'reason'
	| 'word'
>;

/** What an approval approves: the list as it is handed out, without who answered when. */
export const handoverContent = (sheet: number, head: Head, moves: readonly Move[]) => ({
	format: 'merestone-handover-1',
	sheet,
	number: head.number,
	proposal: { number: head.proposal_number, name: head.proposal_name },
	effectiveOn: head.effective_on,
	note: head.note,
	measures: head.measures.map(({ name, unit }) => ({ name, unit })),
	dataDigest: head.data_digest,
	moves: moves.map((move) => ({
		region: { key: move.region_key, name: move.region_name },
		from: move.from_key === null ? null : { key: move.from_key, name: move.from_name },
		to: { key: move.to_key, name: move.to_name },
		figures: move.figures,
		reason: move.reason,
		word: move.word,
	})),
});

/** SHA-256 over the canonical JSON (RFC 8785), as 64 hex digits. */
export const handoverDigest = (sheet: number, head: Head, moves: readonly Move[]): string =>
	createHash('sha256')
		.update(canonicalJson(handoverContent(sheet, head, moves)))
		.digest('hex');
