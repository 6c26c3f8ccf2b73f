import type { Member } from '$lib/server/access/member';

declare global {
	namespace App {
		interface Locals {
			requestId: string;
			/** who is signed in, with the session's expiry */
			user: { id: string; email: string; name: string | null } | null;
			/** where this request is sent when nobody is signed in; set in the signed-in part */
			signInAt?: string;
			/** set below /[team]: this user's membership, with roles */
			member: Member | null;
		}
		interface Error {
			message: string;
			requestId?: string;
		}
	}
}

export {};
