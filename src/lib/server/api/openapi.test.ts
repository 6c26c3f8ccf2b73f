import { describe, expect, it } from 'vitest';
import { operations } from '../../schemas/api/operations.ts';
import { guideOf } from './guide.ts';
import { openApi } from './openapi.ts';

type Node = { [name: string]: unknown };
const description = openApi('https://maps.example') as unknown as {
	openapi: string;
	info: { title: string; version: string };
	paths: Record<string, Record<string, Node>>;
	components: { schemas: Node; securitySchemes: Node };
};

/** Every value below a node. */
function* within(node: unknown): Generator<Node> {
	if (typeof node !== 'object' || node === null) return;
	yield node as Node;
	for (const child of Object.values(node)) yield* within(child);
}

describe('the API’s description', () => {
	it('has what OpenAPI 3.1.0 requires of a document (sections 4.8.1, 4.8.2, 4.8.10)', () => {
		expect(description.openapi).toMatch(/^3\.1\.\d+$/);
		expect(description.info.title && description.info.version).toBeTruthy();
		for (const [path, methods] of Object.entries(description.paths)) {
			expect(path).toMatch(/^\//);
			for (const [method, operation] of Object.entries(methods)) {
				expect(['get', 'put', 'post']).toContain(method);
				expect(Object.keys(operation.responses as Node)).not.toHaveLength(0);
				for (const response of Object.values(operation.responses as Node)) {
					expect((response as Node).description).toBeTruthy();
				}
			}
		}
	});

	it('declares every parameter of every path, once (section 4.8.12)', () => {
		for (const [path, methods] of Object.entries(description.paths)) {
			const wanted = [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => name);
			for (const operation of Object.values(methods)) {
				const parameters = (operation.parameters ?? []) as Node[];
				expect(parameters.map(({ name }) => name)).toEqual(wanted);
				expect(parameters.every((one) => one.in === 'path' && one.required === true)).toBe(true);
			}
		}
	});

	it('names every operation once, and points at nothing that is not there', () => {
		const nodes = [...within(description)];
		const names = nodes.flatMap(({ operationId }) => operationId ?? []);
		expect(names).toEqual(Object.keys(operations));
		for (const { $ref } of nodes) {
			if (typeof $ref !== 'string') continue;
			const found = $ref
				.slice(2)
				.split('/')
				.reduce<unknown>((node, name) => (node as Node)?.[name], description);
			expect(found, $ref).toBeDefined();
		}
	});

	it('closes its requests: an unknown field is refused, so the schema says so', () => {
		const { requestBody } = description.paths['/check/colouring'].post as {
			requestBody: { content: { 'application/json': { schema: Node } } };
		};
		const { schema } = requestBody.content['application/json'];
		expect(schema.additionalProperties).toBe(false);
		expect(schema.required).toEqual(['regions', 'borders', 'inks']);
	});

	it('is told in full on the page for readers', () => {
		const guide = guideOf();
		expect(guide.map(({ id }) => id)).toEqual(Object.keys(operations));
		for (const { summary, answers } of guide) {
			expect(summary).toMatch(/\.$/);
			expect(answers.length).toBeGreaterThan(5);
		}
	});
});
