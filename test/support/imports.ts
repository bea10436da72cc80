import { parseSync } from 'vite';

/** Stands for the name of a module that import() is given as anything but a string. */
export const COMPUTED = '(computed)';

export interface FoundImport {
  /** As written, without a '?worker' or the like at its end. */
  specifier: string;
  line: number;
}

/**
 * Every module a source text names: import (type-only and import() types too), export … from, import(), require(),
 * import.meta.glob() and new URL('…', import.meta.url), the way a worker is named.
 */
export function importsOf(fileName: string, source: string): FoundImport[] {
  const { program, errors } = parseSync(fileName, source);
  if (errors.length > 0) throw new Error(`${fileName} cannot be read: ${errors[0].message}`);
  const found: FoundImport[] = [];
  visit(program, (node) => {
    for (const literal of specifiersOf(node)) {
      const line = source.slice(0, literal.start).split('\n').length;
      found.push({ specifier: literal.value.replace(/\?.*$/, ''), line });
    }
  });
  return found;
}

interface Node {
  type: string;
  [key: string]: unknown;
}

interface StringLiteral {
  value: string;
  start: number;
}

function visit(value: unknown, see: (node: Node) => void): void {
  if (Array.isArray(value)) {
    for (const item of value) visit(item, see);
  } else if (isNode(value)) {
    see(value);
    for (const child of Object.values(value)) visit(child, see);
  }
}

function specifiersOf(node: Node): StringLiteral[] {
  switch (node.type) {
    case 'ImportDeclaration':
    case 'ExportNamedDeclaration':
    case 'ExportAllDeclaration':
    case 'TSImportType':
      return literals(node.source ?? node.argument);
    case 'ImportExpression': {
      const named = literals(node.source);
      return named.length > 0 ? named : [{ value: COMPUTED, start: Number(node.start) }];
    }
    case 'TSExternalModuleReference':
      return literals(node.expression);
    case 'NewExpression':
      return isIdentifier(node.callee, 'URL') && isImportMetaUrl(node) ? literals(node.arguments) : [];
    case 'CallExpression': {
      const globbing = isNode(node.callee) && isIdentifier(node.callee.property, 'glob');
      return globbing || isIdentifier(node.callee, 'require') ? literals(node.arguments) : [];
    }
    default:
      return [];
  }
}

function literals(value: unknown): StringLiteral[] {
  if (Array.isArray(value)) return value.flatMap(literals);
  if (!isNode(value)) return [];
  if (value.type === 'ArrayExpression') return literals(value.elements);
  if (value.type === 'TSLiteralType') return literals(value.literal);
  return typeof value.value === 'string' ? [{ value: value.value, start: Number(value.start) }] : [];
}

function isNode(value: unknown): value is Node {
  return typeof value === 'object' && value !== null && typeof (value as Node).type === 'string';
}

/** new URL('…', import.meta.url) */
function isImportMetaUrl(node: Node): boolean {
  const base = (node.arguments as unknown[])[1];
  return (
    isNode(base) && isIdentifier(base.property, 'url') && isNode(base.object) && base.object.type === 'MetaProperty'
  );
}

function isIdentifier(value: unknown, name: string): boolean {
  return isNode(value) && value.type === 'Identifier' && value.name === name;
}
