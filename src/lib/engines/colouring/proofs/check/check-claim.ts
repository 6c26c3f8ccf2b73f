import type { Claim, ProofFile } from '../proof-form.ts';
import { clausesRefute } from './check-clauses.ts';
import { colouringFault } from './check-inks-do.ts';
import { shapeNeeds } from './check-shape.ts';
import { limits } from './limits.ts';
import { rulesWithout } from './map-rules.ts';
import { claimed, countedInks, nameIn, shapeWords } from './sentences.ts';

/** A claim that was shown, in a sentence; or why it was not. */
export type ClaimChecked = { said: string } | { fault: string; gaveUp?: boolean };

export function checkClaim(file: ProofFile, claim: Claim, steps: number): ClaimChecked {
	switch (claim.claim) {
		case 'inks do':
		case 'works without':
			return checkColouring(file, claim);
		case 'inks do not':
			return checkInksDoNot(file, claim, steps);
		case 'cannot be kept':
			return checkCollision(file, claim, steps);
	}
}

type Of<Kind extends Claim['claim']> = Extract<Claim, { claim: Kind }>;

const notShown = (claim: string, why: string, gaveUp?: boolean): ClaimChecked =>
	gaveUp
		? { fault: `Not settled, the checker gave up: that ${claim}. The reason: ${why}`, gaveUp }
		: { fault: `Not shown: that ${claim}. The reason: ${why}` };

function checkColouring(file: ProofFile, claim: Of<'inks do'> | Of<'works without'>): ClaimChecked {
	const dropped = claim.claim === 'works without' ? claim.locks : [];
	const locked = new Set(file.rules.locks.map(([region]) => region));
	const words = claimed(file, claim);
	if (!dropped.every((region) => locked.has(region))) {
		return notShown(words, 'a lock is dropped that is none.');
	}
	const fault = colouringFault(rulesWithout(file, dropped), claim.colouring, nameIn(file));
	return fault ? notShown(words, fault) : { said: `Shown by a colouring: ${words}.` };
}

function checkInksDoNot(file: ProofFile, claim: Of<'inks do not'>, steps: number): ClaimChecked {
	const { inks, evidence } = claim;
	const words = claimed(file, claim);
	if (evidence.kind !== 'clauses') {
		const needed = shapeNeeds(file, evidence);
		if ('fault' in needed) return notShown(words, needed.fault, needed.gaveUp);
		if (needed.inks <= inks) {
			return notShown(words, `the regions named need ${countedInks(needed.inks)} only.`);
		}
		return { said: `Shown by ${shapeWords(file, evidence)}: ${words}.` };
	}
	const locked = new Set(file.rules.locks.map(([region]) => region));
	const told = clausesRefute(rulesWithout(file), evidence, { most: inks, locked, steps });
	if (!told.shown) return notShown(words, told.fault, told.gaveUp);
	return { said: `Shown by a clause proof on ${shapeWords(file, evidence)}: ${words}.` };
}

function checkCollision(file: ProofFile, claim: Of<'cannot be kept'>, steps: number): ClaimChecked {
	const words = claimed(file, claim);
	const rules = rulesWithout(file);
	if (!claim.locks.every((region) => rules.lock.has(region))) {
		return notShown(words, 'a lock is blamed that is none.');
	}
	const most = claim.inks === 'any' ? limits.inks : claim.inks;
	const locked = new Set(claim.locks);
	const told = clausesRefute(rules, claim.evidence, { most, locked, steps });
	if (!told.shown) return notShown(words, told.fault, told.gaveUp);
	return { said: `Shown by a clause proof on ${shapeWords(file, claim.evidence)}: ${words}.` };
}
