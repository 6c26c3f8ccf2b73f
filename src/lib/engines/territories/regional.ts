import type { AnnealSettings } from './anneal-settings.ts';
import { Annealer } from './anneal.ts';
import type { ContiguityScratch } from './contiguity.ts';
import { Dice } from './dice.ts';
import { fullEnergy } from './search-energy.ts';
import type { SearchState } from './search-state.ts';

export interface RegionalSettings {
	/** how each region is annealed; its territories and seed are set here */
	anneal: Omit<AnnealSettings, 'territories' | 'seed'>;
	regions: number;
	seed: number;
	cancelled?: () => boolean;
	progress?: (share: number) => void;
}

/**
 * Anneals one region after the other: 5 to 11 neighbouring territories are free, the rest is frozen, and
 * what comes out is kept when it is better. Territories outside tolerance come first, then those that
 * units were moved to or from. The plan never gets worse.
 */
export function regionalAnnealing(
	state: SearchState,
	scratch: ContiguityScratch,
	settings: RegionalSettings,
): void {
	const dice = new Dice(settings.seed);
	for (let region = 0; region < settings.regions; region++) {
		if (settings.cancelled?.()) return;
		settings.progress?.(region / settings.regions);
		const centre = chooseCentre(state, dice);
		if (centre < 0) return;
		const territories = around(state, centre, 5 + dice.below(7), dice);
		const seed = dice.next();
		improve(state, scratch, { ...settings.anneal, territories, seed });
	}
}

function chooseCentre(state: SearchState, dice: Dice): number {
	const { prepared } = state.terms;
	const { assignment, outsideCount, outside } = state;
	if (outsideCount > 0 && dice.chance(50000)) {
		const t = outside[dice.below(outsideCount)];
		if (prepared.open[t]) return t;
	}
	for (let tries = 0; tries < 200; tries++) {
		const unit = dice.below(assignment.length);
		const moved = assignment[unit] !== prepared.problem.today[unit];
		if ((moved || tries >= 100) && prepared.open[assignment[unit]]) return assignment[unit];
	}
	return -1;
}

/** `centre` and up to `count` - 1 more open territories, joined to each other. */
function around(state: SearchState, centre: number, count: number, dice: Dice): Int32Array {
	const chosen = [centre];
	const edge: number[] = [];
	const seen = new Set([centre]);
	for (let t = centre; ;) {
		for (const next of neighbours(state, t)) {
			if (seen.has(next) || !state.terms.prepared.open[next]) continue;
			seen.add(next);
			edge.push(next);
		}
		if (edge.length === 0 || chosen.length >= count) return Int32Array.from(chosen).sort();
		// mostly the nearest to the centre, so that regions are round rather than long
		const at = dice.below(Math.min(edge.length, 4));
		[t] = edge.splice(at, 1);
		chosen.push(t);
	}
}

function neighbours({ members, sizes, assignment, terms }: SearchState, t: number): Set<number> {
	const { offsets, targets } = terms.prepared.graph;
	const found = new Set<number>();
	for (let k = 0; k < sizes[t]; k++) {
		const unit = members[t][k];
		for (let i = offsets[unit]; i < offsets[unit + 1]; i++) {
			const other = assignment[targets[i]];
			if (other !== t) found.add(other);
		}
	}
	return found;
}

function improve(state: SearchState, scratch: ContiguityScratch, settings: AnnealSettings): void {
	const units: number[] = [];
	for (const t of settings.territories) {
		for (let k = 0; k < state.sizes[t]; k++) units.push(state.members[t][k]);
	}
	const before = units.map((unit) => state.assignment[unit]);
	const energy = fullEnergy(state, settings, settings.territories);
	new Annealer(state, settings, scratch).run();
	if (fullEnergy(state, settings, settings.territories) < energy + 1e-9) return;
	units.forEach((unit, i) => {
		if (state.assignment[unit] !== before[i]) state.move(unit, before[i]);
	});
}
