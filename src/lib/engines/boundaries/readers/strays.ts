import type { RawLayer } from '../raw-layer.ts';
import { Refusal } from '../refusal.ts';

/** Says which geometries were left out because they enclose nothing; refuses a layer of nothing else. */
export function noteStrays(layer: RawLayer): void {
	const { strayPoints, strayLines } = layer;
	const kinds = [counted(strayPoints, 'point'), counted(strayLines, 'line')].filter(Boolean);
	if (layer.partRings.length === 0) {
		const held = kinds.length ? `, only ${kinds.join(' and ')}` : '';
		throw new Refusal('no-areas', `The file holds no areas${held}.`);
	}
	if (kinds.length === 0) return;
	layer.findings.push({
		code: 'mixed-geometry',
		severity: 'warning',
		message: `The file holds areas, and ${kinds.join(' and ')} that were left out.`,
		regions: [],
		at: null,
	});
}

const counted = (n: number, what: string): string =>
	n === 0 ? '' : `${n.toLocaleString('en')} ${what}${n === 1 ? '' : 's'}`;
