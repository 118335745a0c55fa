import { describe, expect, test } from 'vitest';
import { layerOf, MAY_IMPORT } from './layers';
import { parse, productFiles, type SourceFile } from './source';

const files = productFiles();

function forbiddenImports(file: SourceFile): string[] {
  const from = layerOf(file.path);
  if (!from) return [];
  return file.imports.flatMap(({ target, typeOnly }) => {
    const to = layerOf(target);
    if (target.startsWith('tests/')) return [`${file.path} imports ${target}`];
    if (!to || to === from) return [];
    if (typeOnly) return to === 'app' ? [`${file.path} takes a type from ${target}`] : [];
    return MAY_IMPORT[from].includes(to)
      ? []
      : [`${file.path} (${from}) imports ${target} (${to})`];
  });
}

describe('dependencies', () => {
  test('point one way', () => {
    expect(files.length).toBeGreaterThan(50);
    expect(files.flatMap(forbiddenImports)).toEqual([]);
  });

  test('the scan sees a forbidden import', () => {
    const bad = parse('lib/domain/x.ts', "import { openStore } from '../../db/client';");
    expect(forbiddenImports(bad)).toHaveLength(1);
    const typed = parse('lib/domain/x.ts', "import type { Store } from '../../db/client';");
    expect(forbiddenImports(typed)).toEqual([]);
  });
});

const IMPURE = /\bDate\.now\b|new Date\(\)|Math\.random|\bprocess\.|\bfetch\(|\basync\b|['"]node:/;

describe('the core', () => {
  test('is pure: no clock, no chance, no input or output', () => {
    const impure = files.filter(
      (file) => layerOf(file.path) === 'domain' && IMPURE.test(file.text),
    );
    expect(impure.map((file) => file.path)).toEqual([]);
  });

  test('knows no package but decimal.js, zod and the assignment solver', () => {
    const known = [
      'npm:decimal.js',
      'npm:zod',
      'npm:munkres',
      'npm:fastest-levenshtein',
      'npm:date-fns',
    ];
    const others = files
      .filter((file) => layerOf(file.path) === 'domain')
      .flatMap((file) => file.imports.map((one) => one.target))
      .filter((target) => target.startsWith('npm:') && !known.includes(target));
    expect(others).toEqual([]);
  });
});

describe('the store', () => {
  test('is constructed in one place', () => {
    const makers = files.filter((file) =>
      /new PGlite\(|PGlite\.create\(|new pg\.Pool\(/.test(file.text),
    );
    expect(makers.map((file) => file.path)).toEqual(['db/client.ts']);
  });

  test('is never asked through relational queries, which round nested amounts', () => {
    const users = files.filter((file) => /\.query\.\w+\.find(Many|First)/.test(file.text));
    expect(users.map((file) => file.path)).toEqual([]);
  });
});

describe('the browser', () => {
  test('gets no server code: client files import no store, service or session', () => {
    const server = [
      'schema',
      'queries',
      'store',
      'services',
      'auth',
      'http',
      'mail',
      'work',
      'storage',
    ];
    const leaks = files
      .filter((file) => /^['"]use client['"]/m.test(file.text))
      .flatMap((file) =>
        file.imports
          .filter((one) => !one.typeOnly && server.includes(layerOf(one.target) ?? ''))
          .map((one) => `${file.path} → ${one.target}`),
      );
    expect(leaks).toEqual([]);
  });

  test('gets the grid only through components/grid', () => {
    const users = files.filter(
      (file) =>
        file.imports.some((one) => one.target.startsWith('npm:ag-grid')) &&
        !file.path.startsWith('components/grid/'),
    );
    expect(users.map((file) => file.path)).toEqual([]);
  });
});

describe('routes and pages', () => {
  const entries = files.filter((file) => /^app\/.*\/(route|page)\.tsx?$/.test(file.path));

  test('routes contain nothing but verbs behind their door', () => {
    const thick = entries.filter(
      (file) => file.path.endsWith('route.ts') && file.text.split('\n').length > 40,
    );
    expect(thick.map((file) => file.path)).toEqual([]);
  });

  test('every page behind sign-in asks for a permission', () => {
    const open = entries.filter(
      (file) =>
        file.path.endsWith('page.tsx') &&
        /^app\/\((office|site)\)/.test(file.path) &&
        !/require(Page|Person)\(/.test(file.text),
    );
    expect(open.map((file) => file.path)).toEqual([]);
  });
});

describe('the text of the code', () => {
  test('has no suppressed types, no TODO and no arithmetic on amounts as floats', () => {
    const bad = files.flatMap((file) =>
      file.text.split('\n').flatMap((line, index) => {
        const isBad = /@ts-(ignore|nocheck)|\bTODO\b|\bas any\b|: any\b|parseFloat\(/.test(line);
        return isBad ? [`${file.path}:${index + 1} ${line.trim()}`] : [];
      }),
    );
    expect(bad).toEqual([]);
  });

  test('has no file beyond 400 lines', () => {
    const long = files.filter(
      (file) => file.text.split('\n').length > 400 && file.path !== 'db/seed/story.ts',
    );
    expect(long.map((file) => `${file.path} ${file.text.split('\n').length}`)).toEqual([]);
  });
});
