/** What a Design Tokens file may come to; one that goes further is refused before it is followed. */
export const tokenLimits = {
	/** characters of the text: thousands of tokens fit */
	characters: 1_000_000,
	/** brackets and braces inside each other */
	depth: 32,
	/** groups, tokens and values, those that extended groups repeat among them */
	nodes: 50_000,
	/** aliases that follow each other */
	chain: 64,
	/** inks of a palette */
	inks: 64,
};
