import type { Drawing, Face } from '../../sheet/index.ts';
import { subsetFont } from '../subset-font.ts';
import type { FaceFiles } from '../svg.ts';

/** Characters each face sets on this sheet. */
function characters({ texts }: Drawing): Map<Face, Set<string>> {
	const used = new Map<Face, Set<string>>();
	for (const { face, text } of texts) {
		const set = used.get(face) ?? new Set();
		for (const character of text) set.add(character);
		used.set(face, set);
	}
	return used;
}

/** The faces that a sheet uses, cut down to its letters, in order of their names; those not given are left out. */
export function subsetsOf(drawing: Drawing, files: FaceFiles): [Face, Uint8Array][] {
	return [...characters(drawing)]
		.sort(([a], [b]) => (a < b ? -1 : 1))
		.flatMap(([face, set]): [Face, Uint8Array][] => {
			const file = files[face];
			return file ? [[face, subsetFont(file, [...set].sort().join(''))]] : [];
		});
}
