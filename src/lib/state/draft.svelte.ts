import type { Keeper, KeptDraft } from './kept-drafts';
import type { SaveAnswer, SaveDraft, Saved, Stale } from './save-draft';

export type Saving =
	'saved' | 'waiting' | 'saving' | 'offline' | 'stale' | 'signed-out' | 'refused';

interface Step<Doc> {
	/** what the change did, for "Undo: lock Verton" */
	label: string;
	before: Doc;
	after: Doc;
}

export interface DraftStart<Doc, Answer extends Saved<Doc>> {
	/** under which name the browser keeps what the server does not have */
	place: string;
	revision: number;
	document: Doc;
	savedAt: string;
	save: SaveDraft<Doc, Answer>;
	keeper: Keeper<Doc> | null;
	/** puts mine on top of theirs; `both` names what each had changed differently */
	rebase: (base: Doc, mine: Doc, theirs: Doc) => { draft: Doc; both: string[] };
	/** told before the document is changed, taken back or sent: whatever waits to be put into it goes in now */
	onbefore?: () => void;
	/** told after each save, with what the server computed */
	onsaved?: (saved: Answer) => void;
	/** told after each change of the document, by whatever way */
	onchange?: (document: Doc) => void;
}

const quiet = 700;
const retries = [2_000, 5_000, 15_000, 30_000];
const mostSteps = 200;

/**
 * A draft being worked on: one document of any kind, a line of steps back and forward, saved by itself a moment
 * after each change, kept in this browser until the server has it. Never overwrites what somebody
 * else saved: it stops, says who and when, and asks.
 */
export class DraftState<Doc, Answer extends Saved<Doc> = Saved<Doc>> {
	document: Doc = $state.raw()!;
	savedAt: string = $state()!;
	saving: Saving = $state('saved');
	stale: Stale<Doc> | null = $state.raw(null);
	refusal: string = $state('');
	/** whether the browser could keep the work that the server does not have */
	kept: boolean = $state(true);
	/** when what is shown was restored from this browser: since when it had been kept */
	restoredFrom: string | null = $state(null);
	past: Step<Doc>[] = $state.raw([]);
	future: Step<Doc>[] = $state.raw([]);

	#start: DraftStart<Doc, Answer>;
	#revision: number;
	#base: Doc;
	#timer: ReturnType<typeof setTimeout> | undefined;
	#failures = 0;
	#running = false;

	constructor(start: DraftStart<Doc, Answer>) {
		this.#start = start;
		this.#revision = start.revision;
		this.#base = start.document;
		this.document = start.document;
		this.savedAt = start.savedAt;
	}

	get revision() {
		return this.#revision;
	}
	/** what the server has */
	get base() {
		return this.#base;
	}
	get dirty() {
		return this.document !== this.#base;
	}
	get undoLabel() {
		return this.past.at(-1)?.label ?? null;
	}
	get redoLabel() {
		return this.future.at(-1)?.label ?? null;
	}

	/** One step that can be undone. Steps of the same `run` (typing in a field) become one. */
	change(label: string, make: (draft: Doc) => Doc, run = false) {
		this.#start.onbefore?.();
		const before = this.document;
		const after = make(before);
		if (after === before) return;
		const last = this.past.at(-1);
		const joined = run && last?.label === label && last.after === before;
		this.past = joined
			? [...this.past.slice(0, -1), { ...last, after }]
			: [...this.past.slice(1 - mostSteps), { label, before, after }];
		this.future = [];
		this.#show(after);
	}

	undo() {
		this.#start.onbefore?.();
		const step = this.past.at(-1);
		if (!step) return;
		this.past = this.past.slice(0, -1);
		this.future = [...this.future, step];
		this.#show(step.before);
	}

	redo() {
		this.#start.onbefore?.();
		const step = this.future.at(-1);
		if (!step) return;
		this.future = this.future.slice(0, -1);
		this.past = [...this.past, step];
		this.#show(step.after);
	}

	/** Takes what somebody else saved; my work since then is dropped, by my own choice. */
	async takeTheirs() {
		const { stale } = this;
		if (!stale) return;
		this.#adopt(stale);
		this.past = [];
		this.future = [];
		this.document = stale.document;
		this.saving = 'saved';
		await this.#start.keeper?.forget(this.#start.place);
		this.#start.onchange?.(stale.document);
	}

	/** Puts my changes on top of theirs and saves. Returns the places where both had changed the same. */
	putMineOnTop(): string[] {
		const { stale } = this;
		if (!stale) return [];
		const { draft, both } = this.#start.rebase(this.#base, this.document, stale.document);
		const mine = this.document;
		this.#adopt(stale);
		this.past = [...this.past, { label: 'putting both together', before: mine, after: draft }];
		this.#show(draft);
		return both;
	}

	/** Picks up work that was kept in this browser and never reached the server. */
	async restore() {
		const kept = await this.#start.keeper?.read(this.#start.place).catch(() => null);
		if (!kept || this.dirty) return;
		this.restoredFrom = kept.keptAt;
		if (kept.revision === this.#revision) {
			this.past = [{ label: 'restored work', before: this.#base, after: kept.document }];
			this.#show(kept.document);
		} else this.#restoreStale(kept);
	}

	/** Saves at once what is waiting: on leaving, on coming back online, on asking again. */
	async saveNow() {
		this.#start.onbefore?.();
		clearTimeout(this.#timer);
		if (this.#running || this.stale) return;
		if (!this.dirty) return this.#nothingToSave();
		this.#running = true;
		this.saving = 'saving';
		const sent = this.document;
		const answer = await this.#start.save(this.#revision, sent);
		this.#running = false;
		await this.#settle(answer, sent);
	}

	/** The server has what is shown: just saved, or a change was taken back before it was sent. */
	async #nothingToSave() {
		this.saving = 'saved';
		await this.#start.keeper?.forget(this.#start.place).catch(() => {
			this.kept = false;
		});
	}

	/** The server's page data changed under an untouched draft; with a label, by a step that can be undone. */
	refresh(revision: number, document: Doc, savedAt: string, label?: string) {
		if (this.dirty || revision <= this.#revision) return;
		if (label) {
			this.past = [...this.past, { label, before: this.document, after: document }];
			this.future = [];
		}
		this.#revision = revision;
		this.#base = document;
		this.document = document;
		this.savedAt = savedAt;
		this.#start.onchange?.(document);
	}

	/** What belongs to the document has changed: keeps it in this browser again while the server lacks it. */
	keepNow() {
		if (this.dirty) this.#keep(this.document);
	}

	stop() {
		clearTimeout(this.#timer);
	}

	#adopt({ revision, document, savedAt }: Stale<Doc>) {
		this.#revision = revision;
		this.#base = document;
		this.savedAt = savedAt ?? this.savedAt;
		this.stale = null;
	}

	#restoreStale(kept: KeptDraft<Doc>) {
		const now = { revision: this.#revision, savedBy: null, savedAt: this.savedAt };
		this.stale = { ...now, document: this.#base };
		this.#base = kept.base;
		this.document = kept.document;
		this.saving = 'stale';
		this.#start.onchange?.(kept.document);
	}

	#show(document: Doc) {
		this.document = document;
		this.#start.onchange?.(document);
		this.#keep(document);
		if (this.saving !== 'stale' || !this.stale) this.#schedule(quiet);
	}

	#keep(document: Doc) {
		const { keeper, place } = this.#start;
		keeper?.keep(place, { revision: this.#revision, base: this.#base, document }).then(
			() => (this.kept = true),
			() => (this.kept = false),
		);
	}

	#schedule(wait: number) {
		clearTimeout(this.#timer);
		if (this.saving === 'saved' || this.saving === 'refused') this.saving = 'waiting';
		this.#timer = setTimeout(() => void this.saveNow(), wait);
	}

	async #settle(answer: SaveAnswer<Doc, Answer>, sent: Doc) {
		if (answer.kind === 'saved') return this.#settleSaved(answer.saved, sent);
		if (answer.kind === 'stale') {
			this.stale = answer.stale;
			this.saving = 'stale';
		} else if (answer.kind === 'refused') {
			this.refusal = answer.message;
			this.saving = 'refused';
		} else {
			this.saving = answer.kind === 'signed-out' ? 'signed-out' : 'offline';
			if (answer.kind === 'unreachable')
				this.#schedule(retries[Math.min(this.#failures++, retries.length - 1)]);
		}
	}

	async #settleSaved(saved: Answer, sent: Doc) {
		this.#failures = 0;
		this.#revision = saved.revision;
		const stored = saved.document ?? sent;
		this.#base = stored;
		if (this.document === sent) this.document = stored;
		this.savedAt = saved.savedAt;
		this.restoredFrom = null;
		this.#start.onsaved?.(saved);
		if (this.dirty) {
			this.saving = 'waiting';
			this.#keep(this.document);
			return this.#schedule(quiet);
		}
		await this.#nothingToSave();
	}
}
