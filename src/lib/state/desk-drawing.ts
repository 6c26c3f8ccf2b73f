import { date } from '$lib/components/format';
import type { Desk } from './desk.svelte';
import { Drawer, type DrawReply } from './drawer';
import { drawnSheet } from './drawn-sheet';

/** The line that tells a draft from an issue, in the words that the server puts on the sheet. */
export const draftIssue = (lastEdition: number | undefined, revision: number, savedAt: string) =>
	lastEdition === undefined
		? `Draft ${revision}, ${date(savedAt)}`
		: `Draft after edition ${lastEdition}, ${date(savedAt)}`;

/** Draws the desk's sheet in a worker; asked again whenever the layout changes. */
export function drawInto(desk: Desk, makeWorker: () => Worker) {
	const drawer = new Drawer(makeWorker, (reply: DrawReply) => {
		if ('failed' in reply) desk.drawFailure = reply.failed;
		else {
			desk.drawFailure = '';
			desk.drawn = drawnSheet(reply);
		}
	});
	return {
		draw() {
			const { layout, palette } = desk.draft.document;
			const { regions, borders, findings, editions } = desk.sheet;
			const inks = palette.inks;
			drawer.ask({
				geometry: new URL(`${desk.address}/geometry`, location.href).href,
				input: {
					layout: { ...layout },
					inks: inks.map((ink) => ({ ...ink })),
					borders,
					groups: regions.group,
					colouring: desk.inks.some((ink) => ink >= 0)
						? desk.inks.map((ink) => (ink < inks.length ? ink : -1))
						: null,
					reader: 'typical',
					weak: [],
					issue: draftIssue(editions[0]?.number, desk.draft.revision, desk.draft.savedAt),
				},
				places: Float64Array.from(findings.flatMap(({ at }) => at ?? [0, 0])),
			});
		},
		stop: () => drawer.stop(),
	};
}
