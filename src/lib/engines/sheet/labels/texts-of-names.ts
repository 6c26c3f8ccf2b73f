import type { DrawnText } from '../drawing.ts';
import type { SetName } from './set-name.ts';
import { setAt } from './text-box.ts';

/** White, or, on a region's own fill, whatever that is. */
const anyHalo = '#ffffff';

/** What is drawn of names that have been set; black or white and halo follow from the fills later. */
export function textsOf(names: SetName[]): DrawnText[] {
	return names.flatMap(({ region, box, x, y, ground }) => {
		const onFill = ground === 'fill' || ground === 'edge';
		const halo = ground === 'edge' || ground === 'others';
		return setAt(box, x, y, {
			layer: 'label',
			hex: '#000000',
			...(halo ? { halo: anyHalo } : {}),
			region,
			...(onFill ? { onFill: true } : {}),
		});
	});
}
