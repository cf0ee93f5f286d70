import { readdirSync, readFileSync } from 'node:fs';
import ts from 'typescript';

/** Everything in the source tree that can be reached from outside, by the keys of lib/access/surface.ts. */
export interface FoundSurface {
  pages: string[];
  handlers: string[];
  actions: string[];
  events: string[];
  /** Files with server actions that are not named actions.ts, so that no search by name could miss one. */
  misplacedActions: string[];
}

export function parse(file: string): ts.SourceFile {
  const kind = file.endsWith('x') ? ts.ScriptKind.TSX : ts.ScriptKind.TS;
  return ts.createSourceFile(file, readFileSync(file, 'utf8'), ts.ScriptTarget.ES2022, true, kind);
}

/** Files below a folder whose path ends so, sorted. */
function files(folder: string, ending: RegExp): string[] {
  return readdirSync(folder, { recursive: true, encoding: 'utf8' })
    .map((file) => `${folder}/${file.replaceAll('\\', '/')}`)
    .filter((file) => ending.test(file))
    .sort();
}

/** `app/(people)/people/[id]/page.tsx` is the route `/people/[id]`. */
export function routeOf(file: string): string {
  const parts = file.split('/').slice(1, -1);
  return `/${parts.filter((part) => !/^\(.*\)$/.test(part)).join('/')}`;
}

export function pageFileOf(route: string): string {
  return files('app', /\/page\.tsx$/).find((file) => routeOf(file) === route)!;
}

export function handlerFileOf(key: string): string {
  const route = key.slice(key.indexOf(' ') + 1);
  return files('app', /\/route\.tsx?$/).find((file) => routeOf(file) === route)!;
}

function exportedNames(source: ts.SourceFile): string[] {
  const names: string[] = [];
  source.forEachChild((node) => {
    const exported =
      ts.canHaveModifiers(node) && ts.getModifiers(node)?.some((m) => m.kind === ts.SyntaxKind.ExportKeyword);
    if (ts.isFunctionDeclaration(node) && exported && node.name) names.push(node.name.text);
    if (ts.isVariableStatement(node) && exported)
      node.declarationList.declarations.forEach((d) => names.push(d.name.getText(source)));
    if (ts.isExportDeclaration(node) && node.exportClause && ts.isNamedExports(node.exportClause) && !node.isTypeOnly)
      node.exportClause.elements.forEach((e) => names.push(e.name.text));
  });
  return names;
}

function hasUseServer(source: ts.SourceFile): boolean {
  let found = false;
  const visit = (node: ts.Node): void => {
    if (ts.isExpressionStatement(node) && ts.isStringLiteral(node.expression) && node.expression.text === 'use server')
      found = true;
    ts.forEachChild(node, visit);
  };
  visit(source);
  return found;
}

const ownEvents = ['disconnect', 'disconnecting', 'error', 'connect', 'connection'];

/** First arguments of every `socket.on('…')`, or of anything whose name ends in "socket". */
function socketEvents(source: ts.SourceFile): string[] {
  const found: string[] = [];
  const visit = (node: ts.Node): void => {
    if (ts.isCallExpression(node) && ts.isPropertyAccessExpression(node.expression)) {
      const { expression: receiver, name } = node.expression;
      const event = node.arguments[0];
      if (['on', 'once', 'onAny'].includes(name.text) && /socket$/i.test(receiver.getText(source)))
        found.push(event && ts.isStringLiteral(event) ? event.text : `not a literal: ${event?.getText(source)}`);
    }
    ts.forEachChild(node, visit);
  };
  visit(source);
  return found.filter((event) => !ownEvents.includes(event));
}

export function findSurface(): FoundSurface {
  const sources = ['app', 'components', 'server', 'lib']
    .flatMap((folder) => files(folder, /(?<!\.d)\.tsx?$/))
    .map((file) => ({ file, source: parse(file) }));
  const named = (name: RegExp) => sources.filter(({ file }) => name.test(file));
  const methods = /^(GET|POST|PUT|PATCH|DELETE|HEAD|OPTIONS)$/;
  return {
    pages: named(/^app\/.*page\.tsx$/).map(({ file }) => routeOf(file)),
    handlers: named(/^app\/.*route\.tsx?$/).flatMap(({ file, source }) =>
      exportedNames(source)
        .filter((name) => methods.test(name))
        .map((method) => `${method} ${routeOf(file)}`),
    ),
    actions: named(/\/actions\.ts$/).flatMap(({ file, source }) =>
      exportedNames(source).map((name) => `${file}#${name}`),
    ),
    events: named(/^server\/live\//).flatMap(({ file, source }) =>
      socketEvents(source).map((event) => `${file}#${event}`),
    ),
    misplacedActions: sources
      .filter(({ file, source }) => hasUseServer(source) && !/^app\/.*\/actions\.ts$/.test(file))
      .map(({ file }) => file),
  };
}
