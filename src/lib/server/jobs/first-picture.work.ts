import { gzipSync } from 'node:zlib';
import { encodeFirstPicture, firstPicture } from '../../engines/sheet/index.ts';
import { drawInput, type PaintInput } from './paint.work.ts';
import type { Task } from './task-port.ts';

/**
 * Draws a sheet and makes the coarse picture that its page shows first; empty where nothing is drawn. Names
 * and hatches are no part of it.
 */
export function paintFirst({ input }: Task<PaintInput>): { gzip: Uint8Array } {
	const layout = { ...input.draft.layout, labels: false };
	const { drawing } = drawInput({ ...input, draft: { ...input.draft, layout } }, { bare: true });
	const picture = firstPicture(drawing, input.groups);
	return { gzip: picture ? gzipSync(encodeFirstPicture(picture)) : new Uint8Array() };
}
