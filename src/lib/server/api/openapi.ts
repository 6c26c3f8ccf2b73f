import { z } from 'zod';
import { errorBody } from '../../schemas/api/common.ts';
import { operations, type Operation } from '../../schemas/api/operations.ts';
import { scopeWords } from '../access/scopes.ts';

type Json = Record<string, unknown>;

/** The API's description (OpenAPI 3.1), made from the schemas by which requests are read. */
export function openApi(origin: string): Json {
	const paths: Record<string, Json> = {};
	for (const [id, operation] of Object.entries(operations) as [string, Operation][]) {
		(paths[operation.path] ??= {})[operation.method.toLowerCase()] = described(id, operation);
	}
	return {
		openapi: '3.1.0',
		info: {
			title: 'Merestone',
			version: '1',
			description:
				'Regions are named by their key everywhere, a string. In a pair a < b by code unit. ' +
				'JSON bodies up to 32 MB; 600 requests a minute a token.',
		},
		servers: [{ url: `${origin}/api/v1` }],
		security: [{ token: [] }],
		paths,
		components: {
			securitySchemes: { token: { type: 'http', scheme: 'bearer', description: scopesInWords() } },
			schemas: { Error: schemaOf(errorBody, 'output') },
		},
	};
}

const scopesInWords = () =>
	Object.entries(scopeWords)
		.map(([scope, words]) => `${scope}: ${words}.`)
		.join(' ');

function described(id: string, operation: Operation): Json {
	const { summary, scope, path } = operation;
	const parameters = [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => parameter(name));
	const body = requestBody(operation);
	return {
		operationId: id,
		summary,
		description: `Needs the scope ${scope}.`,
		...(parameters.length > 0 ? { parameters } : {}),
		...(body ? { requestBody: body } : {}),
		responses: responses(operation),
	};
}

const parameter = (name: string): Json => ({
	...{ name, in: 'path', required: true },
	schema: ['sheet', 'edition', 'export', 'proposal', 'recut'].includes(name)
		? { type: 'integer', minimum: 1 }
		: { type: 'string' },
});

function requestBody({ json, form, text }: Operation): Json | null {
	if (text) return { required: true, content: { [text]: { schema: { type: 'string' } } } };
	if (json) {
		return { required: true, content: { 'application/json': { schema: schemaOf(json, 'input') } } };
	}
	if (!form) return null;
	const fields = schemaOf(form, 'input') as { properties: Json };
	const file = { type: 'string', format: 'binary', description: 'after the other fields' };
	const schema = {
		...fields,
		properties: { ...fields.properties, file },
		required: ['file'],
	};
	return { required: true, content: { 'multipart/form-data': { schema } } };
}

const why: Record<number, string> = {
	400: 'Malformed, or a field that is not known; the message names it.',
	401: 'No token, or one that is unknown, withdrawn or past its end.',
	403: 'The token lacks the scope.',
	404: 'There is no such thing in this team.',
	405: 'The route does not know the method.',
	409: 'It does not fit how things stand now.',
	413: 'More than is taken.',
	415: 'Another type than is taken.',
	422: 'Understood, and refused by a check; the details say what and where.',
	429: 'Too many requests; Retry-After says when to come back.',
	503: 'Too much is being computed, or it took too long.',
};

function responses({ status, answer, refusals = [] }: Operation): Json {
	const content = Array.isArray(answer)
		? Object.fromEntries(answer.map((type) => [type, {}]))
		: { 'application/json': { schema: schemaOf(answer, 'output') } };
	const error = { 'application/json': { schema: { $ref: '#/components/schemas/Error' } } };
	const failing = [400, 401, 403, 404, 405, 429, ...refusals].sort((a, b) => a - b);
	return Object.fromEntries([
		[status, { description: status === 202 ? 'Taken in.' : 'Done.', content }],
		...failing.map((code) => [code, { description: why[code], content: error }]),
	]);
}

/** JSON Schema 2020-12, which OpenAPI 3.1 speaks. */
function schemaOf(schema: z.ZodType, io: 'input' | 'output'): Json {
	const made = z.toJSONSchema(schema, { io, unrepresentable: 'any' }) as Json;
	delete made.$schema;
	return made;
}
