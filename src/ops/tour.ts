import { copyFileSync, mkdirSync } from 'node:fs';

/** Takes the README's pictures from those that the browser journeys have just made. */
const tour: Record<string, string> = {
	'analyst-colours': 'colours',
	'states-ring': 'ring',
	collision: 'collision',
	deutan: 'palette',
	'approver-editions': 'editions',
};

mkdirSync('static/tour', { recursive: true });
for (const [from, to] of Object.entries(tour)) {
	copyFileSync(`.data/test/pictures/${from}.png`, `static/tour/${to}.png`);
}
