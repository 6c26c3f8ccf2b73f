import type { RequestEvent, RequestHandler } from '@sveltejs/kit';
import type { Operation } from '../../schemas/api/operations.ts';
import { Forbidden } from '../access/member.ts';
import { UploadFault } from '../files/multipart.ts';
import { FilesAway } from '../files/store.ts';
import { PoolBusy, wasStopped } from '../jobs/pool.ts';
import { log } from '../log.ts';
import { limits, use } from '../services/limits.service.ts';
import { Conflict, NotFound, Refused, TooMany, Unfit } from '../services/outcomes.ts';
import { memberForToken, type TokenMember } from '../services/tokens.service.ts';
import { ApiFault, faultBody } from './fault.ts';

/** The event of a route whose parameters are all there: a route is only reached with them. */
export type ApiEvent = Omit<RequestEvent, 'params'> & { params: Record<string, string> };

/** A route of the API: known by its token, counted, within its scope; every failure in one shape. */
export const apiRoute =
	(
		operation: Operation,
		handle: (member: TokenMember, event: ApiEvent) => Promise<Response>,
	): RequestHandler =>
	async (event) => {
		try {
			const member = await memberOf(event.request);
			await use(limits.callsByToken, member.tokenId ?? '');
			requireScope(member, operation);
			return await handle(member, event as ApiEvent);
		} catch (problem) {
			return faultResponse(faultOf(problem, event.locals.requestId));
		}
	};

/** For methods a route does not know. */
export const notAllowed =
	(...allowed: string[]): RequestHandler =>
	() =>
		faultResponse(
			new ApiFault(405, 'method-not-allowed', `use ${allowed.join(' or ')}`, undefined, {
				allow: allowed.join(', '),
			}),
		);

export const noSuchRoute: RequestHandler = () =>
	faultResponse(new ApiFault(404, 'not-found', 'there is no such route; see /api/v1/openapi.json'));

async function memberOf(request: Request): Promise<TokenMember> {
	const [, bearer] = /^Bearer\s+(\S+)\s*$/i.exec(request.headers.get('authorization') ?? '') ?? [];
	const asks = { 'www-authenticate': 'Bearer' };
	if (!bearer) {
		throw new ApiFault(
			401,
			'token-missing',
			'send a token as Authorization: Bearer',
			undefined,
			asks,
		);
	}
	const member = await memberForToken(bearer);
	if (member) return member;
	const message = 'the token is unknown, withdrawn or past its end';
	throw new ApiFault(401, 'token-unknown', message, undefined, asks);
}

function requireScope(member: TokenMember, { scope }: Operation): void {
	if (member.scopes.includes(scope)) return;
	throw new ApiFault(403, 'scope-missing', `the token lacks the scope ${scope}`, { scope });
}

function faultOf(problem: unknown, requestId: string): ApiFault {
	if (problem instanceof ApiFault) return problem;
	if (problem instanceof UploadFault) {
		return new ApiFault(problem.status, problem.code, problem.message);
	}
	if (problem instanceof NotFound) return new ApiFault(404, 'not-found', problem.message);
	if (problem instanceof Forbidden) return new ApiFault(403, 'forbidden', problem.message);
	if (problem instanceof TooMany) {
		const wait = { 'retry-after': String(problem.retryAfter) };
		return new ApiFault(429, 'too-many', problem.message, undefined, wait);
	}
	if (problem instanceof Conflict) return new ApiFault(409, problem.code, problem.message);
	if (problem instanceof Unfit) return unfitFault(problem);
	if (problem instanceof Refused) return new ApiFault(422, 'refused', problem.message);
	if (problem instanceof PoolBusy) {
		return new ApiFault(503, 'busy', problem.message, undefined, { 'retry-after': '5' });
	}
	if (problem instanceof FilesAway) {
		log.error({ request: requestId, detail: problem.detail }, 'the store of files is away');
		return new ApiFault(503, 'files-away', problem.message, undefined, { 'retry-after': '30' });
	}
	if (wasStopped(problem)) {
		return new ApiFault(503, 'took-too-long', 'the computation was stopped; ask for less effort');
	}
	log.error({ request: requestId, error: inFull(problem) }, 'an API request failed');
	return new ApiFault(500, 'internal', 'something went wrong here', { request: requestId });
}

const unfitFault = ({ code, message, details }: Unfit) =>
	new ApiFault(code === 'malformed' ? 400 : 422, code, message, details);

const inFull = (problem: unknown) =>
	problem instanceof Error ? (problem.stack ?? problem.message) : String(problem);

export const faultResponse = (fault: ApiFault): Response =>
	new Response(faultBody(fault), {
		status: fault.status,
		headers: { ...jsonHeaders, ...fault.headers },
	});

const jsonHeaders = { 'content-type': 'application/json', 'cache-control': 'no-store' };

export const jsonResponse = (body: string, status = 200, headers: Record<string, string> = {}) =>
	new Response(body, { status, headers: { ...jsonHeaders, ...headers } });
