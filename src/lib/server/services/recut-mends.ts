import type { Mend, MendOffer } from '../../engines/boundaries/index.ts';
import { canonicalJson } from '../../engines/editions/index.ts';
import type { Db } from '../database/connection.ts';
import { readFindings } from '../repositories/boundaries.repository.ts';
import { boundaryView } from './boundary-view.ts';
import { Unfit } from './outcomes.ts';

/** The same for mends that say the same. */
export const mendId = (mend: Mend): string => canonicalJson(mend);

/**
 * Looks mends over before the file is read with them: each is one that a finding of these boundaries
 * offers, or is given by hand and names regions that there are. Regions go by the key they have in the
 * file, so those that an earlier mend took away can be named as well.
 */
export async function requireMendable(
	db: Db,
	setId: string,
	before: Mend[],
	mends: Mend[],
): Promise<Mend[]> {
	const findings = await readFindings(db, setId);
	const offers = findings.flatMap((finding) => (finding.offers ?? []) as MendOffer[]);
	const offered = new Set(offers.map(({ mend }) => mendId(mend)));
	const byHand = mends.filter((mend) => !offered.has(mendId(mend)));
	if (byHand.length === 0) return mends;
	const { keys } = await boundaryView(db, setId);
	const there = new Set([
		...keys,
		...before.flatMap(keysOf),
		...findings.flatMap(({ regions }) => regions),
	]);
	const unknown = byHand.flatMap(keysOf).filter((key) => !there.has(key));
	if (unknown.length > 0) {
		throw new Unfit('unknown-region', `The file has no region "${unknown[0]}".`, {
			regions: unknown.slice(0, 20),
		});
	}
	const idle = byHand.find(isIdle);
	if (idle) throw new Unfit('unfit-mend', 'A region cannot be mended with itself.');
	return mends;
}

function keysOf(mend: Mend): string[] {
	if (mend.kind === 'fill') return [mend.into];
	if (mend.kind === 'settle') return [mend.a, mend.b, mend.keep];
	if (mend.kind === 'drop' || mend.kind === 'untangle') return [mend.key];
	return mend.into === null ? [mend.key] : [mend.key, mend.into];
}

const isIdle = (mend: Mend): boolean => {
	if (mend.kind === 'settle') return mend.a === mend.b || ![mend.a, mend.b].includes(mend.keep);
	return (mend.kind === 'merge' || mend.kind === 'part') && mend.key === mend.into;
};
