import { Sat, type Budget } from '../solver/sat.ts';
import { banned } from './bans.ts';
import { choices, isHopeless, type Case } from './explain-case.ts';

/**
 * A case, or the part of it on some vertices, as clauses; each demand is a literal to be assumed.
 *
 * Free vertices with more inks to choose from than neighbours are left out: they can be coloured last.
 * A locked one with so many ("light") has variables only for what is demanded of it. With `switches`
 * every other vertex needs an ink only when its switch is assumed, so that cores name vertices.
 */
export class CaseClauses {
	readonly sat: Sat;
	/** the variable of each demand inside the part, else 0 */
	readonly demandVariable: Int32Array;
	/** the vertices of the part that must have an ink, and their switches */
	readonly needy: number[] = [];
	private readonly first = new Map<number, number>();
	private readonly switches: number[] = [];
	private readonly vertexOfSwitch = new Map<number, number>();
	private readonly demandOfVariable = new Map<number, number>();

	constructor(
		readonly of: Case,
		readonly part: ArrayLike<number>,
		options: { seed?: number; switches?: boolean } = {},
	) {
		this.sat = new Sat({ seed: options.seed });
		this.demandVariable = new Int32Array(of.demands.length);
		const role = roles(of, part);
		for (let i = 0; i < part.length; i++) {
			const v = part[i];
			if (role.get(v) === 'full') this.enterFull(v, options.switches ?? false);
			else if (role.get(v) === 'light') this.enterLight(v);
		}
		for (const v of role.keys()) this.enterBorders(v, role);
	}

	/**
	 * Assumes the demands given (those outside the part are passed over) and the switches of the vertices
	 * in `needing`, or all.
	 */
	solve(demands: Iterable<number>, budget: Budget = {}, needing?: ReadonlySet<number>) {
		const assumptions: number[] = [];
		for (const d of demands) if (this.demandVariable[d]) assumptions.push(this.demandVariable[d]);
		this.needy.forEach((v, i) => {
			if (this.switches.length > 0 && (needing?.has(v) ?? true)) assumptions.push(this.switches[i]);
		});
		return this.sat.solve(assumptions, budget);
	}

	/** The demands that clashed in the last answer. */
	failedDemands(): number[] {
		const demands = this.sat.core().map((literal) => this.demandOfVariable.get(literal));
		return demands.filter((d) => d !== undefined).sort((a, b) => a - b);
	}

	/** The vertices whose switches took part in the last clash. */
	failedVertices(): number[] {
		const vertices = this.sat.core().map((literal) => this.vertexOfSwitch.get(literal));
		return vertices.filter((v) => v !== undefined).sort((a, b) => a - b);
	}

	/** Whether the assignment found last gives a demand what it asks. */
	meets(demand: number): boolean {
		return this.sat.value(this.demandVariable[demand]);
	}

	private enterFull(v: number, switched: boolean): void {
		const { inks, bans, demandsAt, demands } = this.of;
		const some: number[] = [];
		for (let ink = 0; ink < inks; ink++) some.push(this.sat.newVariable());
		this.first.set(v, some[0]);
		for (let ink = 0; ink < inks; ink++) {
			if (banned(bans, v, ink)) this.sat.addClause([-some[ink]]);
		}
		if (switched) {
			const variable = this.sat.newVariable();
			this.switches.push(variable);
			this.vertexOfSwitch.set(variable, v);
			some.push(-variable);
		}
		this.needy.push(v);
		this.sat.addClause(some);
		for (const d of demandsAt.get(v) ?? []) {
			this.setDemand(d, demands[d].ink < inks ? some[demands[d].ink] : this.sat.newVariable());
		}
		this.oneDemandOnly(v);
	}

	private enterLight(v: number): void {
		for (const d of this.of.demandsAt.get(v) ?? []) this.setDemand(d, this.sat.newVariable());
		this.oneDemandOnly(v);
	}

	private setDemand(d: number, variable: number): void {
		this.demandVariable[d] = variable;
		this.demandOfVariable.set(variable, d);
		if (isHopeless(this.of, this.of.demands[d])) this.sat.addClause([-variable]);
	}

	private oneDemandOnly(v: number): void {
		const variables = (this.of.demandsAt.get(v) ?? []).map((d) => this.demandVariable[d]);
		for (let i = 0; i < variables.length; i++) {
			for (let j = 0; j < i; j++) this.sat.addClause([-variables[i], -variables[j]]);
		}
	}

	private enterBorders(v: number, role: Map<number, Role>): void {
		const { offsets, targets } = this.of.graph;
		for (let e = offsets[v]; e < offsets[v + 1]; e++) {
			const w = targets[e];
			if (!role.has(w)) continue;
			if (role.get(v) === 'light') this.differLight(v, w);
			else if (role.get(w) === 'full' && w < v) this.differFull(v, w);
		}
	}

	private differFull(v: number, w: number): void {
		const a = this.first.get(v) as number;
		const b = this.first.get(w) as number;
		for (let ink = 0; ink < this.of.inks; ink++) this.sat.addClause([-(a + ink), -(b + ink)]);
	}

	/** Only the inks demanded of v can clash with what w has. */
	private differLight(v: number, w: number): void {
		for (const d of this.of.demandsAt.get(v) ?? []) {
			const { ink } = this.of.demands[d];
			const other = this.variableOf(w, ink);
			if (other) this.sat.addClause([-this.demandVariable[d], -other]);
		}
	}

	private variableOf(v: number, ink: number): number {
		const first = this.first.get(v);
		if (first !== undefined) return ink < this.of.inks ? first + ink : 0;
		const same = this.of.demandsAt.get(v)?.find((d) => this.of.demands[d].ink === ink);
		return same === undefined ? 0 : this.demandVariable[same];
	}
}

type Role = 'full' | 'light';

/** What becomes of each vertex of the part; those left out have no role. */
function roles(of: Case, part: ArrayLike<number>): Map<number, Role> {
	const { offsets, targets } = of.graph;
	const role = new Map<number, Role>();
	const spare = new Map<number, number>();
	for (let i = 0; i < part.length; i++) role.set(part[i], 'full');
	const gone: number[] = [];
	for (const v of role.keys()) {
		let left = choices(of, v);
		for (let e = offsets[v]; e < offsets[v + 1]; e++) if (role.has(targets[e])) left--;
		spare.set(v, left);
	}
	for (const [v, left] of spare) {
		if (left <= 0) continue;
		if (of.demandsAt.has(v)) role.set(v, 'light');
		else gone.push(v);
	}
	for (const v of gone) role.delete(v);
	for (let i = 0; i < gone.length; i++) {
		for (let e = offsets[gone[i]]; e < offsets[gone[i] + 1]; e++) {
			const w = targets[e];
			if (!role.has(w)) continue;
			const left = (spare.get(w) as number) + 1;
			spare.set(w, left);
			if (left !== 1 || of.demandsAt.has(w)) continue;
			role.delete(w);
			gone.push(w);
		}
	}
	return role;
}
