import { exportKind, plainOptions, type ExportKindId } from '../../engines/exports/index.ts';
import type { Reader } from '../../engines/palettes/index.ts';
import type { ExportChoices } from '../../schemas/export.ts';
import { Unfit } from './outcomes.ts';

/** Kinds that hold the drawing, and so can be drawn as another reader sees it. */
const drawn: readonly ExportKindId[] = ['pdf', 'svg', 'svgz', 'png', 'zip'];

/**
 * The options of this kind, each of them said: those asked for and the usual ones for the rest. One that
 * the kind does not have is refused by name. A package takes the options of whatever it holds.
 */
export function optionsFor(kind: ExportKindId, asked: ExportChoices): Record<string, unknown> {
	const { kinds, ...others } = asked;
	if (kind !== 'zip') return { ...plainOptions[kind], ...known(kind, asked) };
	const held = kinds ?? plainOptions.zip.kinds;
	const options = held.map((one) => [one, { ...plainOptions[one], ...ownOf(one, others) }]);
	for (const name of Object.keys(others)) {
		if (!held.some((one) => name in plainOptions[one])) refuse('zip', name);
	}
	// the order in which they are named makes no other package
	return { kinds: [...new Set(held)].sort(), options: Object.fromEntries(options.sort()) };
}

function known(kind: ExportKindId, asked: ExportChoices): ExportChoices {
	for (const name of Object.keys(asked)) if (!(name in plainOptions[kind])) refuse(kind, name);
	return asked;
}

const ownOf = (kind: ExportKindId, asked: ExportChoices): ExportChoices =>
	Object.fromEntries(Object.entries(asked).filter(([name]) => name in plainOptions[kind]));

function refuse(kind: ExportKindId, option: string): never {
	const message = `${exportKind(kind).words} has no option "${option}".`;
	throw new Unfit('no-such-option', message, { kind, option });
}

/** Tables and styles hold the inks as they are; only drawings can be seen with other eyes. */
export function requireReader(kind: ExportKindId, reader: Reader): void {
	if (reader === 'typical' || drawn.includes(kind)) return;
	const message = `${exportKind(kind).words} holds the inks themselves: it is the same for every reader.`;
	throw new Unfit('same-for-every-reader', message, { kind, reader });
}
