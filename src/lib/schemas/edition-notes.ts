/** An edition that shows a measure: whose figures it keeps, and what became of them on the sheet since. */
export interface ThemedEdition {
	number: number;
	/** name of the measure */
	measure: string;
	/** when the figures that it keeps were taken over, ISO 8601; null where nothing says so */
	figuresAt: string | null;
	since: FiguresSince;
}

/** `replaced`: joined again, `at` in ISO 8601; `gone`: a measure that it names is not on the sheet any more */
export type FiguresSince =
	{ state: 'same' } | { state: 'replaced'; at: string } | { state: 'gone' };

/** `GET sheets/[sheet]/editions/[number]/changes` */
export interface EditionChanges {
	/** number of the edition before; null for the first */
	since: number | null;
	/** none where nothing changed */
	sentences: string[];
}
