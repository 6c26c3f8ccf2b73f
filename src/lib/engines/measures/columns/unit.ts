/** The unit in brackets or parentheses at the end of a heading; a percent sign at its end counts too. */
export function unitOf(heading: string): string | null {
	const bracketed = /[[(]\s*([^\][()]{1,24}?)\s*[\])]\s*$/.exec(heading)?.[1];
	// "(2)" or "(2025)" tells columns apart and is no unit
	if (bracketed && !/^\d+$/.test(bracketed)) return bracketed;
	return /(^|\s)%\s*$/.test(heading) ? '%' : null;
}
