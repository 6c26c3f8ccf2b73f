import { tieRules, type TieGround } from '$lib/engines/editions/edge-ties';
import type { SheetTies } from '$lib/schemas/ties';
import type { Desk } from './desk.svelte';
import { tie, tieEvidence, untie } from './tie-edits';

/** Ties of the sheet on the desk: what could be tied to, how ties stand, and a tie being looked at. */
export class EdgeTies {
	known: SheetTies | null = $state.raw(null);
	/** what the sheet looked at would ask; null while none is */
	ground: TieGround | null = $state.raw(null);
	busy = $state(false);
	failure = $state('');

	rules = $derived.by(() => this.ground && tieRules(this.ground, this.desk.draft.document));

	constructor(
		private readonly desk: Desk,
		// called on its own: a browser's fetch is nobody's method
		private readonly fetcher: typeof fetch = (...asked) => fetch(...asked),
	) {}

	stateOf = (sheet: number) => this.known?.states.find((state) => state.sheet === sheet);

	async load() {
		this.known = (await this.#get<SheetTies>('')) ?? this.known;
	}

	/** Looks along the edge of another sheet, and shows on this one where it would bind. */
	async look(sheet: number, within: number) {
		this.ground = await this.#get<TieGround>(`/${sheet}?within=${within}`);
		if (!this.ground || !this.rules) return;
		const numberOf = (key: string) => this.desk.numbers.get(key);
		this.desk.evidence = tieEvidence(this.ground, this.rules, numberOf);
		this.desk.view = 'sheet';
	}

	/** Ties as looked at, in one step. */
	tie() {
		const { ground } = this;
		if (!ground) return;
		this.drop();
		this.desk.draft.change(`tie to sheet ${ground.sheet}`, tie(ground));
	}

	async refresh(sheet: number, within: number) {
		const ground = await this.#get<TieGround>(`/${sheet}?within=${within}`);
		if (ground) this.desk.draft.change(`refresh the tie to sheet ${sheet}`, tie(ground));
	}

	takeBack(sheet: number) {
		this.drop();
		this.desk.draft.change(`take back the tie to sheet ${sheet}`, untie(sheet));
	}

	drop() {
		this.ground = null;
		this.desk.evidence = null;
	}

	async #get<T>(path: string): Promise<T | null> {
		this.busy = true;
		this.failure = '';
		try {
			const accept = { headers: { accept: 'application/json' } };
			const response = await this.fetcher(`${this.desk.address}/ties${path}`, accept);
			if (response.ok) return await response.json();
			const said = await response.json().catch(() => null);
			this.failure = said?.message ?? `The server answered with an error (${response.status}).`;
		} catch {
			this.failure = 'The connection was lost. Try again.';
		} finally {
			this.busy = false;
		}
		return null;
	}
}
