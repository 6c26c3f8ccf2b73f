import type { PieceColumns } from '../schemas/pieces.ts';

export interface PieceRow {
	id: string;
	region: number;
	/** which of the region's parts, from 0 in the order of the boundaries */
	part: number;
	kind: PieceColumns['kind'][number];
	areaKm2: number;
	within: number;
	/** 1 for the largest piece of the region */
	rank: number;
	/** how many pieces the region has */
	of: number;
}

/** The pieces as rows; those of a region stand together, the largest first. */
export function pieceRows({ region, part, kind, areaKm2, within }: PieceColumns): PieceRow[] {
	const of = new Map<number, number>();
	for (const one of region) of.set(one, (of.get(one) ?? 0) + 1);
	let rank = 0;
	return region.map((one, i) => {
		rank = region[i - 1] === one ? rank + 1 : 1;
		return {
			id: `${one} ${part[i]}`,
			...{ region: one, part: part[i], kind: kind[i], areaKm2: areaKm2[i], within: within[i] },
			...{ rank, of: of.get(one) as number },
		};
	});
}

/** What a piece is: a part cut off, an island, and whether it lies inside another region. */
export function pieceWords({ kind, within, of }: PieceRow): string {
	const what = kind === 'main' ? (of > 1 ? 'main part' : '') : kind;
	if (within < 0) return what || 'whole';
	return what ? `${what}, enclave` : 'enclave';
}
