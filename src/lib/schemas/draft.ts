import { z } from 'zod';
import { readers } from '../engines/colour/reader.ts';
import { goalKinds } from '../engines/colouring/goal-wish.ts';
import {
	differentPairs,
	mostDifferent,
	mostDifferentPairs,
	type Draft,
} from '../engines/editions/draft.ts';
import { ruleLimits } from '../engines/editions/rule-limits.ts';
import { papers } from '../engines/sheet/layout.ts';
import { projectionKinds } from '../engines/sheet/layout/projection-kinds.ts';
import { collarLook } from './layout/collar.ts';
import { frameLayout } from './layout/frame.ts';
import { hexColour } from './layout/hex.ts';
import { lettering } from './layout/lettering.ts';
import { lineLook } from './layout/lines.ts';
import { theme } from './theme.ts';

/** The shape and limits of a draft as it arrives from outside; `Draft` says what each part means. */

/** Widest map that a plan of 100,000 regions can ask for. */
const mostRules = ruleLimits.rules;

/** Furthest across water that a sheet can ask about; the earth is 20,004 km from pole to pole. */
export const mostWaterKm = 200;

const key = z.string().min(1).max(400);
const inkNumber = z.int().min(0).max(ruleLimits.ink);
const sheetNumber = z
	.int()
	.min(1)
	.max(2 ** 31 - 1);
const reason = z.string().max(1_000);

const hatch = z.strictObject({
	kind: z.enum(['lines', 'crossed']),
	angle: z.number().min(0).max(179),
	spacingMm: z.number().min(0.4).max(50),
	widthMm: z.number().min(0.05).max(10),
	hex: hexColour,
});

export const ink = z.strictObject({
	name: z.string().max(80),
	hex: z.string().regex(/^#[0-9a-f]{6}$/, 'an ink is written #rrggbb in lower case'),
	hatch: hatch.optional(),
	fixed: z.literal(true).optional(),
});

const lock = z.strictObject({
	ink: inkNumber,
	cost: z.number().positive().max(ruleLimits.weight),
	by: z.string().max(200).optional(),
	at: z.string().max(40).optional(),
	tie: sheetNumber.optional(),
});

const groupRule = z
	.strictObject({
		kind: z.enum(['alike', 'different']),
		name: z.string().min(1).max(ruleLimits.groupName),
		keys: z.array(key).min(2).max(mostRules),
	})
	.refine(({ kind, keys }) => kind === 'alike' || keys.length <= mostDifferent, {
		message: `at most ${mostDifferent} regions can all be kept different`,
	});

const goalWish = z.strictObject({
	kind: z.enum(goalKinds),
	give: z.number().min(0).max(1),
	readers: z.array(z.enum(readers)).min(1).max(readers.length).optional(),
	against: z
		.union([
			z.strictObject({
				edition: z
					.int()
					.min(1)
					.max(2 ** 31 - 1),
			}),
			z.strictObject({
				revision: z
					.int()
					.min(1)
					.max(2 ** 31 - 1),
			}),
		])
		.optional(),
});

const edgeTie = z.strictObject({
	sheet: sheetNumber,
	name: z.string().max(400),
	edition: z.int().min(1).nullable(),
	revision: z.int().min(0),
	by: z.string().max(200).optional(),
	at: z.string().max(40).optional(),
});

const millimetres = z.number().min(40).max(5_000);

export const sheetLayout = z.strictObject({
	title: z.string().max(200),
	subtitle: z.string().max(300),
	paper: z.union([z.enum(papers), z.strictObject({ widthMm: millimetres, heightMm: millimetres })]),
	orientation: z.enum(['landscape', 'portrait']),
	marginMm: z.number().min(0).max(200),
	projection: z.enum(['auto', ...projectionKinds]),
	labels: z.boolean(),
	groupColumn: z.string().max(400).nullable(),
	legend: z.boolean(),
	scaleBar: z.boolean(),
	credits: z.string().max(1_000),
	frame: frameLayout,
	lettering,
	lines: lineLook,
	collar: collarLook,
});

const handBorder = z.strictObject({
	...{ a: key, b: key, reason },
	by: z.string().max(200).optional(),
	at: z.string().max(40).optional(),
});

export const draftDocument = z.strictObject({
	inks: z.union([z.int().min(1).max(64), z.literal('fewest')]),
	palette: z.strictObject({
		id: z.string().min(1).max(100),
		name: z.string().min(1).max(120),
		inks: z.array(ink).min(1).max(64),
		from: z.string().min(1).max(100).optional(),
	}),
	locks: z.record(key, lock),
	forbidden: z
		.array(z.strictObject({ key, ink: inkNumber, tie: sheetNumber.optional() }))
		.max(mostRules),
	alike: z.array(z.tuple([key, key])).max(mostRules),
	apart: z.array(z.tuple([key, key])).max(mostRules),
	groups: z
		.array(groupRule)
		.max(ruleLimits.groups)
		.refine((groups) => differentPairs(groups) <= mostDifferentPairs, {
			message: `groups in which all differ come to more than ${mostDifferentPairs} pairs`,
		})
		.default([]),
	reserved: z.array(inkNumber).max(ruleLimits.reserved).default([]),
	goals: z.array(goalWish).max(goalKinds.length).default([]),
	ties: z.array(edgeTie).max(100).default([]),
	pointTouches: z.boolean(),
	leastMetres: z.number().min(0).max(1_000_000).default(0),
	waterKm: z.number().min(0).max(mostWaterKm).nullable().default(null),
	struck: z.array(handBorder).max(mostRules),
	added: z.array(handBorder).max(mostRules),
	seed: z.int().min(0).max(0xffffffff),
	layout: sheetLayout,
	theme,
}) satisfies z.ZodType<Draft>;

/** Body of `POST sheets/[sheet]/draft`: the draft, and the revision it was made from. */
export const saveDraft = z.strictObject({
	revision: z.int().min(0),
	document: draftDocument,
	/**
	 * ink of each region as the sender shows it, where it was arranged towards goals or brought back by undo;
	 * taken over if it keeps every rule with no more inks than are needed, else the draft is coloured afresh
	 */
	inks: z.array(inkNumber).max(2_000_000).optional(),
});
export type SaveDraft = z.infer<typeof saveDraft>;
