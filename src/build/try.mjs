// `npm run try`: builds, solves the sample project, writes its pages and says where they are.
import { spawnSync } from 'node:child_process';
import { mkdirSync, readdirSync } from 'node:fs';
import { dirname, join, relative } from 'node:path';
import process from 'node:process';
import { fileURLToPath } from 'node:url';

const root = join(dirname(fileURLToPath(import.meta.url)), '../..');
const sample = 'media/sample';
const pages = 'out/pages';

run('src/build/bundle.mjs');
const checked = run('dist/cli.mjs', 'check', sample);
mkdirSync(join(root, pages), { recursive: true });
for (const name of readdirSync(join(root, sample))
  .filter(file => file.endsWith('.md'))
  .sort()) {
  run('dist/cli.mjs', 'print', `${sample}/${name}`, '-o', `${pages}/${name.replace(/\.md$/, '.html')}`);
}
console.log(`
The pages are in ${relative(process.cwd(), join(root, pages)) || pages}: open one in a browser.
To have it in VS Code: npm run package, then code --install-extension out/tautline.vsix
and open ${sample} with its preview beside it.`);
process.exitCode = checked > 1 ? checked : 0;

/** Exit status 1 says that a requirement is not met, which a sample may show; more than that is a failure. */
function run(script, ...rest) {
  const { status } = spawnSync(process.execPath, [join(root, script), ...rest], { cwd: root, stdio: 'inherit' });
  if (status === null || status > 1) process.exit(status ?? 1);
  return status;
}
