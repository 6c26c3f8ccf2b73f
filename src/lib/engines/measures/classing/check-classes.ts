/**
 * Looks over the classes of a themed map, sharing no code with what makes them. In: figures by region, null
 * where one is not told; the class of each; limits. Out: what is wrong, in sentences; none where limits
 * ascend, every told figure lies within its class (above its lower limit, up to and with its upper one),
 * and every other region is in no class.
 */
export function checkClasses(
	figures: readonly (number | null)[],
	classes: ArrayLike<number>,
	limits: readonly number[],
): string[] {
	const faults: string[] = [];
	if (classes.length !== figures.length) faults.push('There is not one class a region.');
	for (let i = 1; i < limits.length; i++) {
		if (!(limits[i] > limits[i - 1])) faults.push(`Limit ${i + 1} is not above the one before.`);
	}
	figures.forEach((figure, region) => {
		const given = classes[region];
		const isClass = given >= 0 && given <= limits.length;
		if (figure === null) {
			if (isClass) faults.push(`Region ${region} is not told and has class ${given}.`);
			return;
		}
		const above = isClass && (given === 0 || figure > limits[given - 1]);
		const within = isClass && (given === limits.length || figure <= limits[given]);
		if (!above || !within) faults.push(`Region ${region} does not belong in class ${given}.`);
	});
	return faults;
}
