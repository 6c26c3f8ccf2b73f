import { readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import ts from 'typescript';

const folder = 'src/lib/server/services';

/** The names of all exported functions of services that are given a member. */
export function servicesForMembers(): string[] {
	return readdirSync(folder)
		.filter((name) => name.endsWith('.service.ts'))
		.flatMap((name) => namesIn(path.join(folder, name)))
		.sort();
}

function namesIn(file: string): string[] {
	const text = readFileSync(file, 'utf8');
	const source = ts.createSourceFile(file, text, ts.ScriptTarget.Latest, true);
	return source.statements.filter(isExported).flatMap((statement) => {
		if (ts.isFunctionDeclaration(statement)) {
			return takesMember(statement) ? [statement.name?.text ?? ''] : [];
		}
		if (!ts.isVariableStatement(statement)) return [];
		return statement.declarationList.declarations
			.filter(
				({ initializer }) =>
					initializer && ts.isArrowFunction(initializer) && takesMember(initializer),
			)
			.map((declaration) => declaration.name.getText());
	});
}

const isExported = (statement: ts.Statement): boolean =>
	ts.canHaveModifiers(statement) &&
	(ts.getModifiers(statement) ?? []).some((one) => one.kind === ts.SyntaxKind.ExportKeyword);

const takesMember = (declaration: ts.FunctionDeclaration | ts.ArrowFunction): boolean =>
	declaration.parameters.some((parameter) => parameter.type?.getText() === 'Member');
