import { decode } from './literals.ts';

/** Writes down what a solver learns and forgets, one clause a line, in the DRUP text form. */
export class ProofRecorder {
	private lines: string[] = [];

	learnt(codes: ArrayLike<number>): void {
		this.lines.push(line(codes));
	}

	forgotten(codes: ArrayLike<number>): void {
		this.lines.push(`d ${line(codes)}`);
	}

	text(): string {
		return this.lines.length === 0 ? '' : `${this.lines.join('\n')}\n`;
	}
}

function line(codes: ArrayLike<number>): string {
	let text = '';
	for (let k = 0; k < codes.length; k++) text += `${decode(codes[k])} `;
	return `${text}0`;
}
