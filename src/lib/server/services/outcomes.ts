/** What a service throws when the answer is no; routes turn each into its status. */

/** 404: there is no such thing, or not for this member. */
export class NotFound extends Error {
	constructor(what: string) {
		super(`There is no such ${what} here.`);
	}
}

/** 422: understood and permitted, but a rule of the product forbids it. The message is for the reader. */
export class Refused extends Error {
	constructor(
		message: string,
		/** the form's field that the message belongs to */
		readonly field: string | null = null,
	) {
		super(message);
	}
}

/** 429: too many tries; says after how many seconds one more is allowed. */
export class TooMany extends Error {
	constructor(readonly retryAfter: number) {
		super(`Too many tries. Wait ${waitingTime(retryAfter)}, then try again.`);
	}
}

const waitingTime = (seconds: number): string =>
	seconds < 90
		? `${Math.max(1, Math.ceil(seconds))} seconds`
		: `${Math.ceil(seconds / 60)} minutes`;

/** 409: what was asked does not fit how things stand now. */
export class Conflict extends Refused {
	constructor(
		readonly code: string,
		message: string,
	) {
		super(message);
	}
}

/** 422 with a code and details that name what and where, for programs that ask. */
export class Unfit extends Refused {
	constructor(
		readonly code: string,
		message: string,
		readonly details?: Record<string, unknown>,
	) {
		super(message);
	}
}
