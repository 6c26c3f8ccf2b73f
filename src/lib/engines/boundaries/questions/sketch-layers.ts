import type { BoundaryOptions, ByteSource, Limits } from '../options.ts';
import type { Choice } from '../question.ts';
import { Refusal } from '../refusal.ts';
import { readLayer } from '../readers/index.ts';
import { sketchOf } from '../sketch.ts';

/** Layers are drawn for the question only where reading them again is quick. */
const mostBytes = 8 * 1024 ** 2;
const mostLayers = 4;

/**
 * A refusal that asks for a layer, with the first few layers drawn; as it was for large files and for any
 * other refusal. A layer that cannot be read is not drawn.
 */
export async function withSketches(
	refusal: Refusal,
	source: ByteSource,
	options: BoundaryOptions & { limits: Limits },
): Promise<Refusal> {
	const { question, code, message, findings } = refusal;
	if (question?.about !== 'layer' || source.size > mostBytes) return refusal;
	const choices: Choice[] = [];
	for (const [i, choice] of question.choices.entries()) {
		const sketch =
			i < mostLayers ? await sketched(source, { ...options, ...choice.options }) : null;
		choices.push({ ...choice, sketch });
	}
	return new Refusal(code, message, findings, { ...question, choices });
}

async function sketched(source: ByteSource, options: BoundaryOptions & { limits: Limits }) {
	try {
		return sketchOf(await readLayer(source, options, {}));
	} catch (error) {
		if (error instanceof Refusal) return null;
		throw error;
	}
}
