const small = [
	'no',
	'one',
	'two',
	'three',
	'four',
	'five',
	'six',
	'seven',
	'eight',
	'nine',
	'ten',
	'eleven',
	'twelve',
];

/** "four inks", "one region", "13 locks". */
export function counted(count: number, noun: string): string {
	return `${small[count] ?? String(count)} ${noun}${count === 1 ? '' : 's'}`;
}

/** "A, B and C"; of more than `most` names the first ones and how many more. */
export function listed(names: string[], most = 8): string {
	if (names.length > most) {
		return `${names.slice(0, most - 1).join(', ')} and ${names.length - most + 1} more`;
	}
	if (names.length < 2) return names.join('');
	return `${names.slice(0, -1).join(', ')} and ${names[names.length - 1]}`;
}

export function capital(sentence: string): string {
	return sentence.charAt(0).toUpperCase() + sentence.slice(1);
}
