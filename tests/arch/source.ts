import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import ts from 'typescript';

const ROOT = path.resolve(import.meta.dirname, '../..');
const TOP = ['app', 'components', 'db', 'lib', 'importers'];

export interface SourceFile {
  /** From the project's root, with forward slashes. */
  readonly path: string;
  readonly text: string;
  readonly imports: readonly { readonly target: string; readonly typeOnly: boolean }[];
}

/** Every TypeScript file of the product itself, tests beside their files left out. */
export function productFiles(): SourceFile[] {
  const found: SourceFile[] = [];
  const walk = (folder: string) => {
    for (const entry of readdirSync(path.join(ROOT, folder), { withFileTypes: true })) {
      const at = `${folder}/${entry.name}`;
      if (entry.isDirectory()) walk(at);
      else if (/\.tsx?$/.test(entry.name) && !/\.test(-d)?\.tsx?$/.test(entry.name)) {
        found.push(parse(at, readFileSync(path.join(ROOT, at), 'utf8')));
      }
    }
  };
  for (const folder of TOP) walk(folder);
  return found;
}

/** Exported for the scans' own tests. */
export function parse(at: string, text: string): SourceFile {
  const tree = ts.createSourceFile(at, text, ts.ScriptTarget.ESNext, true);
  const imports: { target: string; typeOnly: boolean }[] = [];
  const add = (specifier: string, typeOnly: boolean) => {
    if (specifier.startsWith('@/')) imports.push({ target: specifier.slice(2), typeOnly });
    else if (specifier.startsWith('.')) {
      imports.push({ target: path.posix.join(path.posix.dirname(at), specifier), typeOnly });
    } else imports.push({ target: `npm:${specifier}`, typeOnly });
  };
  const visit = (node: ts.Node) => {
    if (ts.isImportDeclaration(node) && ts.isStringLiteral(node.moduleSpecifier)) {
      const clause = node.importClause;
      const named = clause?.namedBindings;
      const allTypes =
        clause?.isTypeOnly === true ||
        (named !== undefined &&
          ts.isNamedImports(named) &&
          named.elements.length > 0 &&
          !clause?.name &&
          named.elements.every((element) => element.isTypeOnly));
      add(node.moduleSpecifier.text, allTypes);
    } else if (ts.isExportDeclaration(node) && node.moduleSpecifier) {
      add((node.moduleSpecifier as ts.StringLiteral).text, node.isTypeOnly);
    } else if (ts.isCallExpression(node) && node.expression.kind === ts.SyntaxKind.ImportKeyword) {
      const [argument] = node.arguments;
      if (argument && ts.isStringLiteral(argument)) add(argument.text, false);
    }
    ts.forEachChild(node, visit);
  };
  visit(tree);
  return { path: at, text, imports };
}
