import { sheetBorders } from '../../services/draft-problem.ts';
import { answered, type Answer } from '../../api/answer.ts';
import type { DraftInput } from '../colour.work.ts';
import type { Task } from '../task-port.ts';
import { borderRows } from './check-boundaries.work.ts';

/** `GET /sheets/{sheet}/borders`, written in a thread: a large sheet has a hundred thousand of them. */
export const sheetBordersJson = ({ input }: Task<DraftInput>): Promise<Answer> =>
	answered(() => ({ borders: borderRows(input.keys, sheetBorders(input, input.draft)) }));
