import { foundLayers } from '../found.ts';
import type { FoundLayer, Question } from '../question.ts';
import { Refusal } from '../refusal.ts';

/**
 * The layer to read: the one that is named, else the only one that may hold areas. Refused with the
 * question which one where there are several, and with `no-areas` where there is none.
 */
export function chooseLayer<L extends FoundLayer>(format: string, layers: L[], named?: string): L {
	const areas = layers.filter((layer) => layer.areas !== false);
	if (named !== undefined) {
		const chosen = layers.find((layer) => layer.name === named);
		if (chosen) return chosen;
		throw layerNeeded(format, `There is no layer "${named}".`, layers);
	}
	// a lone layer is read whatever it declares, and refused by what it holds
	if (layers.length === 1) return layers[0];
	if (areas.length === 1) return areas[0];
	if (areas.length === 0) throw noLayer(format, layers);
	throw layerNeeded(format, 'The file holds several layers.', layers);
}

function noLayer(format: string, layers: FoundLayer[]): Refusal {
	const held = layers.map(({ name }) => name).join(', ');
	const message = held
		? `The file holds no layer with areas, only points or lines: ${held}.`
		: `The ${format} file holds no layer of features.`;
	return new Refusal('no-areas', message);
}

/** `said` is what is wrong, as a sentence. Layers that hold no areas are no choice. */
function layerNeeded(format: string, said: string, layers: FoundLayer[]): Refusal {
	const choices = layers.filter((layer) => layer.areas !== false);
	const plain = layers.map(({ name, features, areas, crs }) => ({ name, features, areas, crs }));
	const found = foundLayers(format, plain);
	const question: Question = {
		about: 'layer',
		message: 'Which layer holds the regions?',
		choices: choices.map((layer) => ({
			value: layer.name,
			words: layerWords(layer),
			options: { layer: layer.name },
			sketch: null,
		})),
		free: false,
		likeness: found.likeness,
		found,
	};
	const message = `${said} Choose one of: ${choices.map(({ name }) => name).join(', ')}.`;
	return new Refusal('layer-needed', message, [], question);
}

function layerWords({ features, areas, crs }: FoundLayer): string {
	const count =
		features === null
			? 'Features not counted'
			: `${features.toLocaleString('en')} ${features === 1 ? 'feature' : 'features'}`;
	const kind = areas ? ' with areas' : areas === null ? '; areas or not is not known' : '';
	const system = crs ? `, in ${systemName(crs)}` : '';
	return `${count}${kind}${system}.`;
}

/** A code as it is, a definition by its name. */
const systemName = (crs: string): string =>
	(/^\w+\s*\[\s*"([^"]+)"/.exec(crs.trim())?.[1] ?? crs).slice(0, 80);
