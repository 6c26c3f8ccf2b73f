/** An answer of the API other than success; becomes the body `{"error":{...}}`. */
export class ApiFault extends Error {
	constructor(
		readonly status: number,
		readonly code: string,
		message: string,
		readonly details?: Record<string, unknown>,
		readonly headers: Record<string, string> = {},
	) {
		super(message);
	}
}

export const faultBody = ({ code, message, details }: ApiFault): string =>
	JSON.stringify({ error: { code, message, ...(details ? { details } : {}) } });
