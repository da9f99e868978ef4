import { parseAst } from 'vite';

/** Every module that a source names: import, export from, import() and import types. */
export function importsOf(source: string, path: string): string[] {
  const found: string[] = [];
  const visit = (node: unknown): void => {
    if (Array.isArray(node)) return node.forEach(visit);
    if (!isObject(node)) return;
    // Only the nodes that name a module have a literal `source`.
    if (isObject(node['source']) && typeof node['source']['value'] === 'string') found.push(node['source']['value']);
    Object.values(node).forEach(visit);
  };
  visit(parseAst(source, { lang: path.endsWith('x') ? 'tsx' : 'ts' }));
  return found;
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}
