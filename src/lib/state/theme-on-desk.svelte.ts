import {
	limitsHold,
	limitsOf,
	themeClasses,
	toldFigures,
	type ThemeClasses,
} from '$lib/engines/measures/theme-classes';
import type { ThemeGround } from '$lib/engines/measures/theme-figures';
import type { Theme } from '$lib/engines/measures/theme';
import { extremes } from '$lib/engines/measures/classing/moments';
import { addsUp, judgeMeasure } from '$lib/engines/measures/count-or-rate';
import { judgeRamp } from '$lib/engines/palettes/ramp-verdict';
import { sheetTheme } from '$lib/engines/sheet/sheet-theme';
import type { SheetTheme } from '$lib/engines/sheet/themed';
import { date } from '$lib/components/format';
import type { ThemeMeasure } from '$lib/schemas/desk-theme';
import type { Desk } from './desk.svelte';
import { withHandLimits } from './theme-edits';
import { autoTitle, type ThemeState } from './theme-words';

type Part = Partial<Theme>;

/** Parts of a theme from which its limits follow. */
const limiting = ['measure', 'per', 'method', 'classes', 'rounded', 'suppressBelow'] as const;

/** The theme of the sheet that is on the desk: computed here by whoever has the figures, else as it was given. */
export class ThemeOnDesk {
	/** figures of the sheet, for whoever may see them and once the stage was opened */
	measures: readonly ThemeMeasure[] | null = $state.raw(null);
	/** whether the colouring is looked at though the sheet shows a theme */
	apart = $state(false);

	readonly #desk: Desk;

	constructor(desk: Desk) {
		this.#desk = desk;
	}

	get theme(): Theme | null {
		return this.#desk.draft.document.theme;
	}

	measure = $derived.by(() => this.#measureOf(this.theme?.measure));
	/** what the theme is computed from; null without figures */
	ground: ThemeGround | null = $derived.by(() => this.theme && this.groundOf(this.theme));
	classes: ThemeClasses | null = $derived.by(() =>
		this.theme && this.ground ? themeClasses(this.theme, this.ground) : null,
	);
	/** the figures told, without their regions */
	told: number[] = $derived.by(() => (this.classes ? toldFigures(this.classes) : []));
	range = $derived.by(() => extremes(this.told));
	holds = $derived.by(() => {
		if (!this.theme) return true;
		return this.ground ? limitsHold(this.theme, this.ground) : (this.#given?.holds ?? true);
	});
	/** what the sheet is to show; null for its colouring */
	onSheet: SheetTheme | null = $derived.by(() => this.#onSheet());
	/** the same, unless something else is looked at */
	shown: SheetTheme | null = $derived.by(() =>
		this.apart || this.#desk.planning || this.#desk.trial.now ? null : this.onSheet,
	);
	/** what every reader sees of the classes, whichever of them touch */
	verdict = $derived.by(() => {
		const on = this.onSheet;
		const { region } = this.#desk.draft.document.layout.lines;
		return (
			on &&
			judgeRamp(
				on.inks.slice(0, on.told).map(({ hex }) => hex),
				region?.hex,
			)
		);
	});
	/** the same of those that touch on this sheet, hatches among them, at its printed size */
	judged = $derived.by(() => {
		const on = this.onSheet;
		const { layout } = this.#desk.draft.document;
		return on && this.#desk.judge({ palette: { inks: on.inks }, layout }, on.classes);
	});

	/** why the theme has nothing to show */
	get trouble() {
		if (!this.theme) return null;
		if (!this.measures) return this.#given?.trouble ?? null;
		const { per } = this.theme;
		const asked = [this.theme.measure, ...(per.kind === 'measure' ? [per.measure] : [])];
		const found = asked.map((name) => this.#measureOf(name));
		if (found.includes(null)) return 'gone';
		return found.some((one) => one?.stale) ? 'stale' : null;
	}

	/** The classes as the server gave them; they are of the theme it has, which may be an earlier one. */
	get #given() {
		return this.#desk.sheet.theme;
	}

	/** what the measure is taken for; null without figures */
	kind = $derived.by(() => {
		const { measure } = this;
		return measure && judgeMeasure(measure.name, measure.unit, measure.values);
	});
	/** whether a total fills areas, and nobody said that it is a rate */
	misleads = $derived.by(() => {
		const { theme, kind } = this;
		return Boolean(theme && kind && addsUp(kind) && !theme.isRate && theme.per.kind === 'none');
	});
	/** for the docket */
	state: ThemeState | null = $derived.by(() => {
		const { theme, onSheet } = this;
		if (!theme || !onSheet) return null;
		const { title, told } = onSheet;
		const untold = onSheet.classes.reduce((sum, one) => sum + Number(one >= told), 0);
		const { trouble, holds, misleads } = this;
		const alike = this.judged?.mark === 'error' || this.verdict?.usable === false;
		return { title, told, untold, trouble, holds, misleads, alike };
	});

	groundOf(theme: Theme): ThemeGround | null {
		if (!this.measures) return null;
		const { areaKm2 } = this.#desk.sheet.regions;
		const nothing = areaKm2.map(() => null);
		const valuesOf = (name: string) => {
			const measure = this.#measureOf(name);
			return measure && !measure.stale ? measure.values : nothing;
		};
		const { per } = theme;
		return {
			values: valuesOf(theme.measure),
			areasKm2: areaKm2,
			denominators: per.kind === 'measure' ? valuesOf(per.measure) : null,
		};
	}

	/** A first theme of a measure. */
	begin(name: string) {
		const theme: Theme = {
			...{ measure: name, per: { kind: 'none' }, isRate: false, method: 'natural-breaks' },
			...{ classes: 5, breaks: [], rounded: true, ramp: 'house-dusk', reversed: false },
			...{ middle: null, suppressBelow: null, title: '' },
		};
		this.#put(`show ${name}`, { ...theme, title: this.#titleOf(theme) }, false);
	}

	/** One step of the draft; limits and the title follow unless they were set by hand. */
	change(label: string, part: Part, run = false) {
		const before = this.theme;
		if (!before) return;
		const after: Theme = { ...before, ...part };
		const others = after.measure !== before.measure || after.per !== before.per;
		if (others && after.method === 'by-hand') after.method = 'natural-breaks';
		// said of one measure, not of whichever comes after it
		if (others) delete after.figuresInFiles;
		if (before.title === this.#titleOf(before) && part.title === undefined)
			after.title = this.#titleOf(after);
		this.#put(label, after, run, !limiting.some((one) => one in part));
	}

	/** Limits set by hand, kept in order. */
	setLimits(label: string, breaks: readonly number[], run = false) {
		const before = this.theme;
		if (before) this.#put(label, withHandLimits(before, breaks), run, true);
	}

	/** The limits that the method gives for today's figures. */
	renew() {
		if (this.theme) this.#put('make the classes anew', this.theme, false);
	}

	drop() {
		this.apart = false;
		this.#desk.draft.change('show the colouring', (draft) => ({ ...draft, theme: null }));
	}

	#put(label: string, theme: Theme, run: boolean, keepsLimits = false) {
		const ground = this.groundOf(theme);
		const breaks =
			keepsLimits || !ground || theme.method === 'by-hand' ? theme.breaks : limitsOf(theme, ground);
		this.apart = false;
		this.#desk.draft.change(label, (draft) => ({ ...draft, theme: { ...theme, breaks } }), run);
	}

	#titleOf(theme: Theme): string {
		return autoTitle(theme, this.#measureOf(theme.measure)?.unit ?? '');
	}

	#measureOf(name: string | undefined): ThemeMeasure | null {
		return this.measures?.find((one) => one.name === name) ?? null;
	}

	#onSheet(): SheetTheme | null {
		const { theme, classes, measure } = this;
		if (!theme) return null;
		if (classes && this.measures) {
			const takenAt = measure?.takenAt ?? null;
			return sheetTheme(theme, classes, {
				table: measure?.table ?? null,
				date: takenAt && date(takenAt),
				holds: this.holds && this.trouble === null,
			});
		}
		const given = this.#given;
		return given && { ...given, classes: Int32Array.from(given.classes) };
	}
}
