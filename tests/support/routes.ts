import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import ts from 'typescript';

export type Route = {
	/** As the framework names it: "/(member)/classes/[slot=id]". */
	id: string;
	isPage: boolean;
	/** Whether the page has a load on the server, and so a `__data.json`. */
	hasData: boolean;
	/** As the table of rules names them: "GET", "PATCH", "POST ?/default". */
	methods: string[];
};

const httpMethods = ['GET', 'HEAD', 'POST', 'PUT', 'PATCH', 'DELETE', 'OPTIONS'];

/** Every route of the tree, read from the files themselves: what is there, not what is meant. */
export function listRoutes(root = 'src/routes'): Route[] {
	const routes: Route[] = [];
	visit('');
	return routes.sort((a, b) => (a.id < b.id ? -1 : 1));

	function visit(folder: string): void {
		const path = join(root, folder);
		const route = readRoute(path, folder === '' ? '/' : folder);
		if (route) routes.push(route);
		for (const entry of readdirSync(path, { withFileTypes: true })) {
			if (entry.isDirectory()) visit(`${folder}/${entry.name}`);
		}
	}
}

function readRoute(path: string, id: string): Route | null {
	const endpoint = join(path, '+server.ts');
	const load = join(path, '+page.server.ts');
	const isPage = ['+page.svelte', '+page.server.ts', '+page.ts'].some((file) =>
		existsSync(join(path, file))
	);
	if (!isPage && !existsSync(endpoint)) return null;
	const methods = new Set<string>();
	if (isPage) methods.add('GET');
	if (existsSync(load)) for (const name of actionsOf(load)) methods.add(`POST ?/${name}`);
	if (existsSync(endpoint)) {
		for (const name of exportsOf(endpoint)) {
			if (name === 'fallback') throw new Error(`${id}: a fallback answers methods without a rule`);
			if (httpMethods.includes(name)) methods.add(name);
		}
	}
	const hasData = existsSync(load) && exportsOf(load).includes('load');
	return { id, isPage, hasData, methods: [...methods].sort() };
}

function parse(file: string): ts.SourceFile {
	return ts.createSourceFile(file, readFileSync(file, 'utf8'), ts.ScriptTarget.Latest, true);
}

/** The names that a module exports as values. */
function exportsOf(file: string): string[] {
	return parse(file).statements.flatMap((statement) => {
		if (ts.isExportDeclaration(statement)) {
			const clause = statement.exportClause;
			if (!clause || !ts.isNamedExports(clause)) throw new Error(`${file}: export * hides routes`);
			return clause.elements.map((element) => element.name.text);
		}
		if (!isExported(statement)) return [];
		if (ts.isFunctionDeclaration(statement)) return statement.name ? [statement.name.text] : [];
		if (ts.isVariableStatement(statement)) {
			return statement.declarationList.declarations.map((d) => d.name.getText());
		}
		return [];
	});
}

/** The keys of `export const actions = { ... }`; anything less plain is an error, not a guess. */
function actionsOf(file: string): string[] {
	for (const statement of parse(file).statements) {
		if (!ts.isVariableStatement(statement) || !isExported(statement)) continue;
		for (const declaration of statement.declarationList.declarations) {
			if (declaration.name.getText() !== 'actions') continue;
			return keysOf(declaration.initializer, file);
		}
	}
	return [];
}

function keysOf(value: ts.Expression | undefined, file: string): string[] {
	if (value && (ts.isSatisfiesExpression(value) || ts.isAsExpression(value))) {
		return keysOf(value.expression, file);
	}
	if (!value || !ts.isObjectLiteralExpression(value)) {
		throw new Error(`${file}: actions must be written out as an object`);
	}
	return value.properties.map((property) => {
		if (!property.name || !ts.isIdentifier(property.name)) {
			throw new Error(`${file}: an action without a plain name`);
		}
		return property.name.text;
	});
}

const isExported = (statement: ts.Statement) =>
	ts.canHaveModifiers(statement) &&
	(ts.getModifiers(statement) ?? []).some((m) => m.kind === ts.SyntaxKind.ExportKeyword);

/** An address of the route, with something plausible in each blank. */
export function addressOf(id: string): string {
	const path = id
		.split('/')
		.filter((part) => !/^\(.*\)$/.test(part))
		.join('/')
		.replace(/\[\[?(?:\.\.\.)?(\w+)(?:=(\w+))?\]?\]/g, (_, name: string, kind?: string) =>
			sample(name, kind)
		);
	return path === '' ? '/' : path;
}

function sample(name: string, kind?: string): string {
	if (kind === 'date' || kind === 'week' || name === 'week' || name === 'date') return '2026-11-30';
	if (kind === 'month') return '2026-12';
	if (kind === 'id') return '1';
	return 'nothing-by-this-name';
}
