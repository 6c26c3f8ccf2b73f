import { createHash } from 'node:crypto';
import { canonicalJson } from '../../engines/editions/canonical-json.ts';
import type { Draft, HandBorder } from '../../engines/editions/draft.ts';

/**
 * A digest of what a draft asks of the colouring engine: the same for two drafts that differ only in looks,
 * in who decided something, in goals or in the arrangement asked for.
 */
export function problemDigest(draft: Draft, boundarySetId: string): string {
	const { inks, alike, apart, reserved, pointTouches, leastMetres, waterKm } = draft;
	const asked = {
		...{ boundarySetId, inks, alike, apart, reserved, pointTouches, leastMetres, waterKm },
		locks: Object.fromEntries(
			Object.entries(draft.locks).map(([key, { ink, cost }]) => [key, [ink, cost]]),
		),
		forbidden: draft.forbidden.map(({ key, ink }) => [key, ink]),
		groups: draft.groups.map(({ kind, keys }) => [kind, keys]),
		struck: draft.struck.map(pairOf),
		added: draft.added.map(pairOf),
	};
	return createHash('sha256').update(canonicalJson(asked)).digest('hex');
}

const pairOf = ({ a, b }: HandBorder) => [a, b];
