// Bundles what is shipped into dist/. The same sources give the same bytes: no dates, no machine's paths.
// With names behind it (`bundle.mjs cli server`) it makes only those, and leaves the others as they are.
import { chmod, mkdir, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { dirname, join, relative } from 'node:path';
import process from 'node:process';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const root = join(dirname(fileURLToPath(import.meta.url)), '../..');
const dist = join(root, 'dist');

// The server and the extension run on VS Code's own Node; the command line on whatever Node the machine has.
const NODE = { platform: 'node', target: 'node20', format: 'cjs', outExtension: { '.js': '.cjs' } };
const MODULE = { target: 'node20', format: 'esm', outExtension: { '.js': '.mjs' } };
// VS Code for the Web reads an extension as CommonJS from a file that ends in .js.
const BROWSER = { platform: 'browser', target: 'es2022', format: 'cjs' };

/** What an ES module would know of its own place, for one that is bundled as CommonJS. */
const PLACE = {
  define: { 'import.meta.url': 'place' },
  banner: { js: "const place = require('node:url').pathToFileURL(__filename).href;" },
};

/**
 * The desktop extension is three files, so that opening a README in VS Code reads the smallest of them only: the client
 * is read when a note is open, the page when the preview asks for its plugin.
 */
const BUNDLES = {
  extension: {
    ...NODE,
    entryPoints: { extension: 'src/extension/node.ts' },
    external: ['vscode', './client.cjs', './page.cjs'],
  },
  client: { ...NODE, entryPoints: { client: 'src/extension/client-node.ts' }, external: ['vscode'] },
  page: { ...NODE, entryPoints: { page: 'src/page/index.ts' } },
  server: { ...NODE, entryPoints: { server: 'src/server/node-main.ts' } },
  'extension-web': { ...BROWSER, entryPoints: { 'extension-web': 'src/extension/browser.ts' }, external: ['vscode'] },
  'server-web': { ...BROWSER, format: 'iife', entryPoints: { 'server-web': 'src/server/browser-main.ts' } },
  plugin: {
    ...MODULE,
    platform: 'neutral',
    mainFields: ['module', 'main'],
    entryPoints: { 'markdown-it-plugin': 'src/page/index.ts' },
  },
  // A small file starts the program from compiled code. The server is a file of its own, which no other command reads.
  cli: { ...NODE, entryPoints: { cli: 'src/cli/start.ts' }, banner: { js: '#!/usr/bin/env node' } },
  'cli-program': {
    ...NODE,
    ...PLACE,
    entryPoints: { 'cli/program': 'src/cli/main.ts' },
    // A script that is started from compiled code may require, not import.
    supported: { 'dynamic-import': false },
    plugins: [apart('../server/node-main.ts', '../server.cjs')],
  },
};

const asked = process.argv.slice(2);
const unknown = asked.filter(name => !(name in BUNDLES));
if (unknown.length > 0) {
  throw new Error(`no bundle is named ${unknown.join(', ')}; there are ${Object.keys(BUNDLES).join(', ')}`);
}
const wanted = Object.entries(BUNDLES).filter(([name]) => asked.length === 0 || asked.includes(name));
const made = await Promise.all(wanted.map(([, options]) => bundle(options)));
await mkdir(dist, { recursive: true });
if (wanted.some(([name]) => name === 'cli')) await chmod(join(dist, 'cli.cjs'), 0o755);
if (asked.length === 0) {
  await writeFile(join(dist, 'third-party-licences.txt'), await licences(made));
  await removeOthers(['third-party-licences.txt', ...made.flatMap(outputsOf)]);
}

/** Paths below dist, with forward slashes. */
function outputsOf({ metafile }) {
  return Object.keys(metafile.outputs).map(path => path.slice('dist/'.length));
}

/** What an earlier build left. Last, so that who runs from dist meanwhile finds all files at any time. */
async function removeOthers(kept) {
  for (const entry of await readdir(dist, { recursive: true, withFileTypes: true })) {
    const path = relative(dist, join(entry.parentPath, entry.name)).replaceAll('\\', '/');
    if (entry.isFile() && !kept.includes(path)) await rm(join(dist, path));
  }
}

function bundle(options) {
  return build({
    absWorkingDir: root,
    outdir: 'dist',
    bundle: true,
    minify: true,
    // Every licence stands in one file beside the bundles.
    legalComments: 'none',
    logLevel: 'warning',
    metafile: true,
    // The build of yaml for Node asks for modules of Node that nothing here needs.
    alias: { yaml: './node_modules/yaml/browser/index.js' },
    ...options,
  });
}

/** Leaves one module of the sources out of a bundle: it is read from a file of its own when it is asked for. */
function apart(source, file) {
  return {
    name: `apart ${source}`,
    setup: ({ onResolve }) => {
      onResolve({ filter: /./ }, ({ path }) => (path === source ? { path: file, external: true } : undefined));
    },
  };
}

/** The licences of the packages that went into the bundles, by name. A package without one stops the build. */
async function licences(results) {
  const outputs = results.flatMap(({ metafile }) => Object.values(metafile.outputs));
  const shipped = outputs.flatMap(({ inputs }) => Object.keys(inputs).filter(path => inputs[path].bytesInOutput > 0));
  const folders = new Set(shipped.flatMap(path => /^.*node_modules\/(?:@[^/]+\/)?[^/]+/.exec(path)?.[0] ?? []));
  const texts = [...folders].sort().map(async folder => {
    const { name, version, license } = JSON.parse(await readFile(join(root, folder, 'package.json'), 'utf8'));
    const file = (await readdir(join(root, folder))).find(entry => /^licen[cs]e/i.test(entry));
    if (file === undefined) throw new Error(`${folder} has no licence file`);
    return `${name} ${version} (${license})\n\n${(await readFile(join(root, folder, file), 'utf8')).trim()}\n`;
  });
  return (await Promise.all(texts)).join(`\n${'-'.repeat(80)}\n\n`);
}
