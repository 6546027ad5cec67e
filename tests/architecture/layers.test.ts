import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import { dirname, join, relative } from 'node:path';
import { describe, expect, it } from 'vitest';

const root = process.cwd();
const floors = ['app', 'components', 'lib', 'storage', 'models'] as const;

function listSources(folder: string): string[] {
  return readdirSync(join(root, folder)).flatMap((name) => {
    const path = join(folder, name);
    if (statSync(join(root, path)).isDirectory()) return listSources(path);
    return /\.(ts|tsx|mjs)$/.test(name) ? [path] : [];
  });
}

type Import = { from: string; to: string; typeOnly: boolean };

function resolveImport(from: string, spec: string): string | null {
  if (!spec.startsWith('@/') && !spec.startsWith('.')) return null;
  const base = spec.startsWith('@/') ? spec.slice(2) : relative(root, join(root, dirname(from), spec));
  const tries = ['', '.ts', '.tsx', '.mjs', '/index.ts', '/route.ts'].map((end) => base + end);
  return tries.find((path) => existsSync(join(root, path)) && statSync(join(root, path)).isFile()) ?? base;
}

function importsOf(file: string): Import[] {
  const text = readFileSync(join(root, file), 'utf8');
  return [...text.matchAll(/^\s*(?:import|export)\s+(type\s+)?([^'"]*?from\s+)?['"]([^'"]+)['"]/gm)].flatMap(
    (match) => {
      const to = resolveImport(file, match[3]!);
      const names = /\{([^}]*)\}/.exec(match[2] ?? '')?.[1];
      const allTypes =
        names !== undefined &&
        names.split(',').every((name) => name.trim() === '' || name.trim().startsWith('type '));
      return to ? [{ from: file, to, typeOnly: Boolean(match[1]) || allTypes }] : [];
    },
  );
}

const sources = floors.flatMap(listSources).filter((file) => !/\.test\.tsx?$/.test(file));
const imports = sources.flatMap(importsOf);
const floorOf = (file: string) => file.split('/')[0]!;
const say = ({ from, to }: Import) => `${from} -> ${to}`;

/** What a file reaches by value imports, itself included. */
function reach(file: string, seen = new Set<string>()): Set<string> {
  if (seen.has(file)) return seen;
  seen.add(file);
  for (const step of imports) if (step.from === file && !step.typeOnly) reach(step.to, seen);
  return seen;
}

describe('the floors of the house', () => {
  it('imports run downwards: app, components, lib, then storage and models', () => {
    const mayImport: Record<string, string[]> = {
      app: ['app', 'components', 'lib', 'storage'],
      components: ['components', 'lib'],
      lib: ['lib', 'storage', 'models', 'seeders', 'package.json'],
      storage: ['storage', 'lib'],
      models: ['models'],
    };
    const wrong = imports.filter(({ from, to }) => {
      const [low, high] = [floorOf(from), floorOf(to)];
      return low === 'app'
        ? ![...mayImport.app!, 'package.json'].includes(high) && !high.endsWith('.css')
        : !mayImport[low]!.includes(high);
    });
    expect(wrong.map(say)).toEqual([]);
  });

  it('storage takes nothing from lib but its settings', () => {
    const wrong = imports.filter(
      ({ from, to }) => floorOf(from) === 'storage' && floorOf(to) === 'lib' && to !== 'lib/env.ts',
    );
    expect(wrong.map(say)).toEqual([]);
  });

  it('route files and pages never import a model', () => {
    const wrong = imports.filter(
      ({ from, to, typeOnly }) =>
        floorOf(from) === 'app' && !typeOnly && /^models\/|lib\/database\/records/.test(to),
    );
    expect(wrong.map(say)).toEqual([]);
  });

  it('only lib/env.ts reads the environment', () => {
    const readers = sources.filter((file) => /process\.env/.test(readFileSync(join(root, file), 'utf8')));
    expect(readers).toEqual(['lib/env.ts']);
  });

  it('what the browser gets reaches neither the database, the store nor the settings', () => {
    const clients = sources.filter((file) =>
      /^['"]use client['"]/.test(readFileSync(join(root, file), 'utf8')),
    );
    expect(clients.length).toBeGreaterThan(5);
    const wrong = clients.flatMap((file) =>
      [...reach(file)]
        .filter((to) => /^(models|storage)\/|lib\/(database|env|log|auth\/current|audit\/recorded)/.test(to))
        .map((to) => `${file} -> ${to}`),
    );
    expect(wrong).toEqual([]);
  });

  it('no folder is called utils or helpers, and no index file only hands names on', () => {
    expect(sources.filter((file) => /(^|\/)(utils?|helpers?)(\/|\.)/.test(file))).toEqual([]);
    expect(sources.filter((file) => /\/index\.tsx?$/.test(file))).toEqual(['models/index.ts']);
  });

  it('no file has more than 300 lines', () => {
    const long = sources.filter((file) => readFileSync(join(root, file), 'utf8').split('\n').length > 300);
    expect(long).toEqual([]);
  });
});

describe('the OpenAPI document', () => {
  it('lists every route file', () => {
    const listed = readFileSync(join(root, 'app/api/v1/openapi.json/documented-routes.ts'), 'utf8');
    const routes = listSources('app/api').filter(
      (file) => file.endsWith('/route.ts') && !/nextauth|openapi|api\/\[\.\.\.path\]/.test(file),
    );
    const missing = routes.filter((file) => !listed.includes(`'@/${file.replace(/\.ts$/, '')}'`));
    expect(missing).toEqual([]);
  });
});
