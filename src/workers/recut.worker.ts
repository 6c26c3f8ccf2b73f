import {
	boxOf,
	closer,
	drawSide,
	frameOf,
	join,
	placeIn,
	sideOf,
	type Box,
	type Side,
} from '$lib/components/boundaries/side-drawing';
import { decodeCoverage } from '$lib/engines/boundaries/codec';
import type { DrawReply, DrawRequest, Sight } from '$lib/state/recut-drawer';

/** Draws two versions of the boundaries into one frame, off the page's thread. */
let sides: { before: Side; after: Side; whole: Box } | null = null;

async function load(address: string): Promise<Side> {
	const response = await fetch(address);
	if (!response.ok) throw new Error(`the geometry could not be fetched (${response.status})`);
	return sideOf(decodeCoverage(new Uint8Array(await response.arrayBuffer())));
}

async function loadBoth(before: string, after: string): Promise<DrawReply> {
	const [one, other] = await Promise.all([load(before), load(after)]);
	const whole: Box = [...one.box];
	join(whole, other.box);
	sides = { before: one, after: other, whole };
	const named = ({ coverage: { keys, names } }: Side) => ({ keys, names });
	return { told: 'loaded', sides: { before: named(one), after: named(other) }, box: whole };
}

/** how much air stands round what is looked at, as a share of it */
const [airRoundAll, airRoundSome] = [0.04, 0.5];

function draw({ focus, at, marked, steps }: Sight): DrawReply {
	if (!sides) return { told: 'failed', message: 'the geometry is not there yet' };
	const { before, after, whole } = sides;
	const boxes = focus
		? [boxOf(before, focus.before), boxOf(after, focus.after)].filter((box) => box !== null)
		: [];
	const box: Box = boxes.length ? [...boxes[0]] : whole;
	for (const one of boxes) join(box, one);
	const frame = closer(frameOf(box, boxes.length ? airRoundSome : airRoundAll), at, steps);
	return {
		told: 'drawn',
		drawn: {
			frame,
			before: drawSide(before, frame, marked.before, focus?.before ?? []),
			after: drawSide(after, frame, marked.after, focus?.after ?? []),
			place: at && placeIn(frame, at),
		},
	};
}

self.onmessage = async ({ data }: MessageEvent<DrawRequest>) => {
	const reply =
		data.ask === 'load'
			? await loadBoth(data.before, data.after).catch((error: unknown): DrawReply => ({
					told: 'failed',
					message: error instanceof Error ? error.message : String(error),
				}))
			: draw(data);
	self.postMessage(reply);
};
