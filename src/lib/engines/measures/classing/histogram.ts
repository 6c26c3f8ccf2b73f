import { extremes } from './moments.ts';
import { quantile } from './quantiles.ts';

export interface Histogram {
	/** left end of the first bin, and the width of each */
	from: number;
	width: number;
	/** values in each bin; one on the edge of two is in the upper, the greatest in the last */
	counts: number[];
	/** the width that the rule asks for would give more bins than are shown */
	capped: boolean;
}

/** More bars could not be told apart beside the classes. */
const mostBins = 48;

/**
 * Bins for a histogram. In: one finite value or more. Out: 1 to 48 bins from the least to the greatest.
 * Width by Freedman and Diaconis 1981 (Zeitschrift fuer Wahrscheinlichkeitstheorie 57, 453-476): twice the
 * interquartile range over the cube root of their number; where that is nought, as many bins as Sturges 1926
 * (JASA 21(153) 65-66) gives.
 */
export function histogram(values: readonly number[]): Histogram {
	const { least, most } = extremes(values);
	if (!(most > least)) return { from: least, width: 0, counts: [values.length], capped: false };
	const sorted = Float64Array.from(values).sort();
	const spread = quantile(sorted, 0.75) - quantile(sorted, 0.25);
	const asked =
		spread > 0
			? Math.ceil((most - least) / ((2 * spread) / Math.cbrt(values.length)))
			: Math.ceil(Math.log2(values.length)) + 1;
	const bins = Math.max(1, Math.min(mostBins, asked));
	const width = (most - least) / bins;
	const counts = new Array<number>(bins).fill(0);
	for (const value of values) counts[Math.min(bins - 1, Math.floor((value - least) / width))]++;
	return { from: least, width, counts, capped: asked > mostBins };
}
