export interface InkUse {
	/** ink number from 0 */
	ink: number;
	regions: number;
	/** share of the area of all regions, 0 to 1 */
	areaShare: number;
}

/** How much of the sheet each ink covers, for the inks in use and those of the palette (`least`). */
export function inkUse(
	colouring: ArrayLike<number>,
	areas: ArrayLike<number>,
	least: number,
): InkUse[] {
	const uses: InkUse[] = [];
	const of = (ink: number) => (uses[ink] ??= { ink, regions: 0, areaShare: 0 });
	for (let ink = 0; ink < least; ink++) of(ink);
	let whole = 0;
	for (let region = 0; region < colouring.length; region++) {
		whole += areas[region];
		if (colouring[region] < 0) continue;
		const use = of(colouring[region]);
		use.regions++;
		use.areaShare += areas[region];
	}
	for (let ink = 0; ink < uses.length; ink++) of(ink).areaShare /= whole || 1;
	return uses;
}
