import { openApi } from './openapi.ts';

/** A route as the API's page shows it. */
export interface GuideRoute {
	id: string;
	method: string;
	path: string;
	summary: string;
	needs: string;
	/** fields of the body or the form */
	fields: { name: string; type: string; required: boolean; description: string }[];
	/** statuses with what they mean */
	answers: { status: string; words: string }[];
}

type Schema = {
	type?: string | string[];
	const?: unknown;
	enum?: unknown[];
	anyOf?: Schema[];
	items?: Schema;
	prefixItems?: Schema[];
	description?: string;
	properties?: Record<string, Schema>;
	required?: string[];
};

interface Described {
	operationId: string;
	summary: string;
	description: string;
	requestBody?: { content: Record<string, { schema: Schema }> };
	responses: Record<string, { description: string }>;
}

/** The description of the API, flattened for reading. */
export function guideOf(): GuideRoute[] {
	const { paths } = openApi('') as { paths: Record<string, Record<string, Described>> };
	return Object.entries(paths).flatMap(([path, methods]) =>
		Object.entries(methods).map(([method, described]) => ({
			id: described.operationId,
			method: method.toUpperCase(),
			path: `/api/v1${path}`,
			summary: described.summary,
			needs: described.description,
			fields: fieldsOf(described),
			answers: Object.entries(described.responses).map(([status, { description }]) => ({
				status,
				words: description,
			})),
		})),
	);
}

function fieldsOf({ requestBody }: Described): GuideRoute['fields'] {
	const [body] = Object.values(requestBody?.content ?? {});
	return Object.entries(body?.schema.properties ?? {}).map(([name, schema]) => ({
		name,
		type: typeInWords(schema),
		required: body.schema.required?.includes(name) ?? false,
		description: schema.description ?? '',
	}));
}

function typeInWords(schema: Schema): string {
	if (schema.enum) return schema.enum.map((value) => JSON.stringify(value)).join(' | ');
	if (schema.const !== undefined) return JSON.stringify(schema.const);
	if (schema.anyOf) return schema.anyOf.map(typeInWords).join(' | ');
	if (schema.prefixItems) return `[${schema.prefixItems.map(typeInWords).join(', ')}]`;
	if (schema.items) return `list of ${typeInWords(schema.items)}`;
	return [schema.type ?? 'value'].flat().join(' | ');
}
