// Holds the house in shape: an import goes down a floor, never up, never sideways and never in a circle, and the rooms
// of the core touch nothing outside the language. Run alone it prints what is wrong and exits with 1 where something is.
import { readdirSync, readFileSync } from 'node:fs';
import { builtinModules } from 'node:module';
import { dirname, join, relative, resolve } from 'node:path';
import process from 'node:process';
import { fileURLToPath } from 'node:url';

/** Ground first. Rooms of one floor do not know each other, but for what `SIDEWAYS` allows. */
export const FLOORS = [
  ['quantity'],
  ['language'],
  ['model'],
  ['mechanics'],
  ['virtual-work'],
  ['note'],
  ['working', 'drawing'],
  ['page'],
  ['server', 'cli'],
  ['extension'],
];

/** The command line starts the language server. */
const SIDEWAYS = ['cli → server'];

/** The core: pure, so that it runs unchanged in Node, in a worker and in a browser. */
const CORE = ['quantity', 'language', 'model', 'mechanics', 'virtual-work', 'note', 'working', 'drawing', 'page'];

/** Packages that a room of the core may import. */
const PACKAGES: ReadonlyMap<string, readonly string[]> = new Map([
  ['quantity', ['mathjs']],
  ['note', ['markdown-it', 'yaml']],
  ['page', ['markdown-it', 'katex']],
]);

/** Names of what the core leaves to the faces: process, clock, chance, network, console, page. */
const OUTSIDE =
  /(?<![.\w'"`$-])(process|Buffer|require|__dirname|__filename|globalThis|Date|performance|console|setTimeout|setInterval|setImmediate|fetch|window|localStorage)\s*[.(]|\bMath\.random\b/g;

const root = join(dirname(fileURLToPath(import.meta.url)), '../..');

/** One line for each breach, in the order of the paths. `files`: path below src, with forward slashes, to its text. */
export function breaches(files: ReadonlyMap<string, string>): string[] {
  const found: string[] = [];
  const graph = new Map<string, string[]>();
  for (const [path, text] of [...files].sort(([a], [b]) => (a < b ? -1 : 1))) {
    const room = roomOf(path);
    const code = withoutComments(text);
    if (floorOf(room) < 0) {
      found.push(`${path}: ${room} is no room of the house`);
      continue;
    }
    const imports = importsOf(code);
    const targets = imports.filter(isRelative).map(specifier => join(dirname(path), specifier).replaceAll('\\', '/'));
    graph.set(path, targets);
    for (const target of targets) found.push(...breachOfImport(path, target));
    if (!CORE.includes(room)) continue;
    for (const specifier of imports) if (!isRelative(specifier)) found.push(...breachOfPackage(path, room, specifier));
    for (const match of code.matchAll(OUTSIDE)) found.push(`${path}: the core does not use ${match[1] ?? match[0]}`);
  }
  return [...found, ...circles(graph)];
}

/** Every TypeScript file of src. */
export function sources(folder: string = join(root, 'src')): Map<string, string> {
  const files = new Map<string, string>();
  for (const entry of readdirSync(folder, { recursive: true, withFileTypes: true })) {
    const path = join(entry.parentPath, entry.name);
    const name = relative(folder, path).replaceAll('\\', '/');
    if (entry.isFile() && name.endsWith('.ts')) files.set(name, readFileSync(path, 'utf8'));
  }
  return files;
}

function breachOfImport(path: string, target: string): string[] {
  const from = roomOf(path);
  const to = roomOf(target);
  if (from === to) return target === `${to}/index.ts` ? [`${path}: a room does not import its own entry file`] : [];
  // The faces read the version from the manifest.
  if (target === '../package.json' && !CORE.includes(from)) return [];
  if (floorOf(to) < 0) return [`${path}: ${target} is in no room`];
  if (floorOf(to) > floorOf(from)) return [`${path}: ${to} lies above ${from}`];
  if (floorOf(to) < floorOf(from) || SIDEWAYS.includes(`${from} → ${to}`)) return [];
  return [`${path}: ${from} and ${to} lie on one floor and do not know each other`];
}

function breachOfPackage(path: string, room: string, specifier: string): string[] {
  const name = specifier
    .split('/')
    .slice(0, specifier.startsWith('@') ? 2 : 1)
    .join('/');
  const isOutside = specifier.startsWith('node:') || builtinModules.includes(name) || name === 'vscode';
  if (isOutside) return [`${path}: the core does not import ${specifier}`];
  return (PACKAGES.get(room) ?? []).includes(name) ? [] : [`${path}: ${room} does not import the package ${name}`];
}

/** Circles of files, each told once, from its first file. */
function circles(graph: ReadonlyMap<string, readonly string[]>): string[] {
  const found: string[] = [];
  const state = new Map<string, 'open' | 'done'>();
  const visit = (path: string, trail: readonly string[]): void => {
    if (state.get(path) === 'done') return;
    if (state.get(path) === 'open') {
      found.push(`circle: ${[...trail.slice(trail.indexOf(path)), path].join(' → ')}`);
      return;
    }
    state.set(path, 'open');
    for (const target of graph.get(path) ?? []) visit(target, [...trail, path]);
    state.set(path, 'done');
  };
  for (const path of graph.keys()) visit(path, []);
  return found;
}

/** Static and dynamic imports and re-exports, those of types included. */
function importsOf(code: string): string[] {
  const pattern = /\b(?:import|export)\b[^'";]*?\bfrom\s*['"]([^'"]+)['"]|\bimport\s*\(?\s*['"]([^'"]+)['"]/g;
  return [...code.matchAll(pattern)].map(match => match[1] ?? match[2] ?? '');
}

function withoutComments(text: string): string {
  return text.replace(/\/\*[\s\S]*?\*\/|(?<![:'"`])\/\/.*$/gm, '');
}

function isRelative(specifier: string): boolean {
  return specifier.startsWith('.');
}

function roomOf(path: string): string {
  return path.slice(0, path.indexOf('/'));
}

function floorOf(room: string): number {
  return FLOORS.findIndex(rooms => rooms.includes(room));
}

if (process.argv[1] !== undefined && resolve(process.argv[1]) === fileURLToPath(import.meta.url)) {
  const found = breaches(sources());
  for (const breach of found) console.error(breach);
  if (found.length === 0) console.log('The import floors hold.');
  process.exit(found.length === 0 ? 0 : 1);
}
