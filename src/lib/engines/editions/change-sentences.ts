import type { Change, Differences } from './differences.ts';

const counted = (count: number, one: string, many: string): string =>
	`${count.toLocaleString('en-GB')} ${count === 1 ? one : many}`;

const most = 8;

/** "a, b and 3 more" */
function named(changes: readonly Change[], words: (what: string) => string): string {
	const names = changes.slice(0, most).map(({ what }) => words(what));
	const more = changes.length - names.length;
	return names.join(', ') + (more > 0 ? ` and ${more.toLocaleString('en-GB')} more` : '');
}

/** `legendTitle` as `legend title` */
const apart = (what: string): string =>
	what.replace(/([a-z])([A-Z])/g, (_, a: string, b: string) => `${a} ${b.toLowerCase()}`);

const isShown = ({ what }: Change) => what === 'shown';

/**
 * What changed from one state of a sheet to another, as plain sentences, one a subject, none where it is
 * as it was. They count regions and name settings, and tell no figure of any region.
 */
export function changeSentences(found: Differences): string[] {
	const { regions, palette, rules, layout, classes, figures, territories } = found;
	return [
		found.boundariesChanged ? 'The boundaries are others.' : '',
		regions.length
			? `${counted(regions.length, 'region has', 'regions have')} another ink in the colouring.`
			: '',
		palette.length ? `Palette changed: ${named(palette, inkFromOne)}.` : '',
		rules.length ? `${counted(rules.length, 'rule was', 'rules were')} changed.` : '',
		themeSentence(found.theme),
		classes.length && !found.theme.some(isShown)
			? `${counted(classes.length, 'region is', 'regions are')} in another class.`
			: '',
		figures.length ? figureSentence(figures) : '',
		territorySentence(territories),
		layout.length ? `Layout changed: ${named(layout, apart)}.` : '',
	].filter(Boolean);
}

const inkFromOne = (what: string) =>
	what.replace(/^ink (\d+)$/, (_, number: string) => `ink ${Number(number) + 1}`);

function themeSentence(theme: readonly Change[]): string {
	if (theme.length === 0) return '';
	const shown = theme.find(isShown);
	if (!shown) return `Theme changed: ${named(theme, themeWord)}.`;
	return shown.after === null
		? `The sheet shows its colouring in place of ${String(shown.before)}.`
		: `The sheet shows ${String(shown.after)} in place of its colouring.`;
}

const themeWords: Record<string, string> = {
	per: 'what it is divided by',
	isRate: 'whether it is a rate',
	breaks: 'limits',
	classes: 'number of classes',
	rounded: 'rounding of limits',
	reversed: 'direction of the ramp',
	middle: 'middle of the ramp',
	suppressBelow: 'suppression',
	figuresInFiles: 'whether files carry figures',
};
const themeWord = (what: string): string => themeWords[what] ?? what;

function figureSentence(figures: readonly Change[]): string {
	const others = figures.filter(({ what }) => what !== 'taken over').length;
	return others > 0
		? `The figures are others in ${counted(others, 'region', 'regions')}.`
		: 'The figures were taken over again.';
}

function territorySentence(territories: readonly Change[]): string {
	if (territories.length === 0) return '';
	const moved = territories.filter(({ what }) => what.startsWith('region ')).length;
	const renamed = territories.length - moved;
	const said = [
		moved ? `${counted(moved, 'region is', 'regions are')} in another territory` : '',
		renamed ? `${counted(renamed, 'territory has', 'territories have')} another name` : '',
	];
	return `${said.filter(Boolean).join(', ')}.`;
}
