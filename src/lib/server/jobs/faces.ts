import { readFileSync } from 'node:fs';
import path from 'node:path';
import type { FaceFiles } from '../../engines/exports/index.ts';
import { faceStyles, type Face } from '../../engines/sheet/index.ts';

let kept: FaceFiles | undefined;

/** The faces shipped with the product, as whole TrueType files. */
export function faceFiles(): FaceFiles {
	kept ??= Object.fromEntries(
		(Object.keys(faceStyles) as Face[]).map((face) => [
			face,
			new Uint8Array(readFileSync(path.resolve('static/fonts', `${face}.ttf`))),
		]),
	);
	return kept;
}
