import { readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import ts from 'typescript';

/** Reads the route files below a folder as source and tells what guards each way in. */

export interface WayIn {
	/** as the framework names it, such as `/(app)/[team]/members` */
	route: string;
	file: string;
	/** `load`, a method such as `GET`, or `action invite` */
	entry: string;
	/** the actions named in calls of `memberFor` there */
	actions: string[];
	/** whether it asks who is signed in */
	asksUser: boolean;
}

const routesFolder = 'src/routes';
const methods = ['GET', 'POST', 'PUT', 'PATCH', 'DELETE', 'OPTIONS', 'HEAD', 'fallback'];

/** Every load, form action and handler on the server below this route. */
export function waysIn(below: string): WayIn[] {
	return serverFiles(path.join(routesFolder, below)).flatMap((file) => {
		const source = ts.createSourceFile(
			file,
			readFileSync(file, 'utf8'),
			ts.ScriptTarget.Latest,
			true,
		);
		const route = `/${path.relative(routesFolder, path.dirname(file))}`;
		return entriesOf(source).map(({ entry, node }) => ({
			...{ route, file, entry },
			actions: argumentsOf(node, 'memberFor'),
			asksUser: argumentsOf(node, 'userFor').length > 0,
		}));
	});
}

function serverFiles(folder: string): string[] {
	return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
		const place = path.join(folder, entry.name);
		if (entry.isDirectory()) return serverFiles(place);
		return /^\+(page\.server|layout\.server|server)\.ts$/.test(entry.name) ? [place] : [];
	});
}

function entriesOf(source: ts.SourceFile): { entry: string; node: ts.Node }[] {
	const found: { entry: string; node: ts.Node }[] = [];
	for (const statement of source.statements) {
		if (!isExported(statement)) continue;
		for (const { name, node } of declared(statement)) {
			if (name === 'load' || methods.includes(name)) found.push({ entry: name, node });
			if (name === 'actions') found.push(...formActions(node));
		}
	}
	return found;
}

const isExported = (statement: ts.Statement): boolean =>
	ts.canHaveModifiers(statement) &&
	(ts.getModifiers(statement) ?? []).some((one) => one.kind === ts.SyntaxKind.ExportKeyword);

function declared(statement: ts.Statement): { name: string; node: ts.Node }[] {
	if (ts.isFunctionDeclaration(statement)) {
		return [{ name: statement.name?.text ?? '', node: statement }];
	}
	if (!ts.isVariableStatement(statement)) return [];
	return statement.declarationList.declarations.map((one) => ({
		name: one.name.getText(),
		node: one.initializer ?? one,
	}));
}

function formActions(node: ts.Node): { entry: string; node: ts.Node }[] {
	const inner = ts.isSatisfiesExpression(node) ? node.expression : node;
	if (!ts.isObjectLiteralExpression(inner)) throw new Error('actions are no plain object');
	return inner.properties.map((property) => ({
		entry: `action ${property.name?.getText() ?? ''}`,
		node: property,
	}));
}

/** The words in the second argument of each call of this function within the node; '' where there is none. */
function argumentsOf(node: ts.Node, name: string): string[] {
	const found: string[] = [];
	const visit = (inner: ts.Node): void => {
		if (ts.isCallExpression(inner) && inner.expression.getText() === name) {
			found.push(...wordsIn(inner.arguments[1]));
		}
		ts.forEachChild(inner, visit);
	};
	visit(node);
	return found;
}

function wordsIn(node: ts.Node | undefined): string[] {
	if (!node) return [''];
	if (ts.isStringLiteral(node)) return [node.text];
	if (!ts.isConditionalExpression(node)) return [''];
	return [...wordsIn(node.whenTrue), ...wordsIn(node.whenFalse)];
}
