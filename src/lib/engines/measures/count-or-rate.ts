export interface CountJudgement {
	kind: 'count' | 'amount' | 'rate' | 'unknown';
	/** why, as the end of a sentence that begins "because" */
	because: string;
}

const rateWords =
	/%|‰|\bper\b|\/|\b(rate|ratio|share|percent(age)?|average|mean|median|density|index|score|quota)s?\b/i;
/** visits per week still grow with the region */
const overTime = /(\bper\b|\ba\b|\/)\s*(day|week|month|quarter|year|annum)\b/gi;
const amountUnits =
	/^(h|hours?|min|minutes?|days?|eur|euros?|€|usd|\$|gbp|£|chf|k€|m€|t|tonnes?|kg|litres?|l|kwh|mwh|km|m)$/i;

/**
 * Whether a measure is a total, which grows with the region that it is counted in, or a rate, which does
 * not. In: its name, its unit, its values. Judged by rules of the house: words and units of rates first
 * (%, per, share, density ...), then units of amounts (hours, money, weight), then whole numbers from nought
 * up, of which some exceed 1. The judgement can be wrong, so whoever knows the figures has the last word.
 */
export function judgeMeasure(
	name: string,
	unit: string,
	values: readonly (number | null)[],
): CountJudgement {
	const said = [unit, name].find((text) => rateWords.test(text.replace(overTime, '')));
	if (said !== undefined) return { kind: 'rate', because: `"${said}" is said of a rate` };
	if (amountUnits.test(unit.trim())) {
		return { kind: 'amount', because: `amounts in ${unit.trim()} add up from region to region` };
	}
	const known = values.filter((value) => value !== null);
	const whole = known.length > 0 && known.every((value) => Number.isInteger(value) && value >= 0);
	if (whole && known.some((value) => value > 1)) {
		return { kind: 'count', because: 'every figure is a whole number' };
	}
	return { kind: 'unknown', because: 'neither name, unit nor figures say what it is' };
}

/** Whether it misleads to fill areas with it as it is. */
export const addsUp = ({ kind }: CountJudgement): boolean => kind === 'count' || kind === 'amount';
