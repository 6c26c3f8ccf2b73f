import {
	explanationSentence,
	type Explanation,
	type Proof,
	type Rule,
} from '../../../engines/colouring/index.ts';

/** Results with regions by key, as programs read them. */

type Keys = readonly string[];

export const colouringByKey = (keys: Keys, inks: ArrayLike<number>): Record<string, number> =>
	Object.fromEntries(keys.map((key, region) => [key, inks[region]]));

export const proofByKey = (keys: Keys, { kind, regions, refutation }: Proof) => ({
	kind,
	regions: regions.map((region) => keys[region]),
	...(refutation ? { refutation } : {}),
});

export const explanationByKey = (keys: Keys, found: Explanation) => ({
	locks: named(keys, found.locks),
	rules: found.rules.map((rule) => ruleByKey(keys, rule)),
	regions: named(keys, found.regions),
	message: explanationSentence(
		found,
		(region) => keys[region],
		(ink) => `ink ${ink}`,
	),
	release: found.release && { ...found.release, locks: named(keys, found.release.locks) },
	inksThatWouldDo: found.inksThatWouldDo,
});

const named = (keys: Keys, regions: readonly number[]) => regions.map((region) => keys[region]);

function ruleByKey(keys: Keys, rule: Rule) {
	if (rule.kind === 'inks') return rule;
	if ('region' in rule) return { ...rule, region: keys[rule.region] };
	return { kind: rule.kind, a: keys[rule.a], b: keys[rule.b] };
}
