// `npm run try`: builds, solves the sample project, writes its pages, and says how to open them and how to go on.
import { spawnSync } from 'node:child_process';
import { mkdirSync, readdirSync } from 'node:fs';
import { dirname, join } from 'node:path';
import process from 'node:process';
import { fileURLToPath } from 'node:url';

const root = join(dirname(fileURLToPath(import.meta.url)), '../..');
const sample = 'media/sample';
const pages = 'out/pages';

run(['src/build/bundle.mjs']);
run(['dist/cli.cjs', 'check', sample]);
const written = writePages();
console.log(`
The same notes as pages, to be opened in a browser or printed:
${written.map(page => `  ${page}`).join('\n')}

To have it where the notes are written:
  npm run package && code --install-extension out/tautline.vsix
  code ${sample}/slip-canopy.md        and open its preview beside it
On the command line:
  node dist/cli.cjs --help
The language is told in media/reference.md.`);

function writePages() {
  mkdirSync(join(root, pages), { recursive: true });
  const notes = readdirSync(join(root, sample)).filter(name => name.endsWith('.md'));
  return notes.sort().map(name => {
    const page = `${pages}/${name.replace(/\.md$/, '.html')}`;
    run(['dist/cli.cjs', 'print', `${sample}/${name}`, '-o', page], 'ignore');
    return page;
  });
}

/** Exit status 1 says that a requirement is not met, which a sample may show; more than that is a failure. */
function run([script, ...rest], out = 'inherit') {
  const { status } = spawnSync(process.execPath, [join(root, script), ...rest], {
    cwd: root,
    stdio: ['ignore', out, 'inherit'],
  });
  if (status === null || status > 1) process.exit(status ?? 1);
}
