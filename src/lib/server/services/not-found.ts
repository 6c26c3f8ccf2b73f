/**
 * Thrown by services when there is no such thing, or none that the one who asks may know of: another
 * team's sheet is as unknown as one that never was. Routes turn it into 404.
 */
export class NotFound extends Error {
	constructor(readonly what: string) {
		super(`there is no such ${what}`);
	}
}

/** Thrown when what was asked does not fit how things stand now. Routes turn it into 409. */
export class Conflict extends Error {
	constructor(
		readonly code: string,
		message: string,
	) {
		super(message);
	}
}

/** Thrown when what was given is understood but cannot be taken. Routes turn it into 422. */
export class Unfit extends Error {
	constructor(
		readonly code: string,
		message: string,
		readonly details?: Record<string, unknown>,
	) {
		super(message);
	}
}
