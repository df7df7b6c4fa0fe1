// Pictures of the real thing, to be looked at: a note beside its preview, with a hover, in each theme.
// `node test/editor/screenshots.mjs [NOTE [WORDS]]` writes out/screenshots/THEME.png from the
// packaged extension (`npm run package` first); WORDS is where the pointer rests.
import { cpSync, mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import process from 'node:process';
import { fileURLToPath } from 'node:url';
import { openBrowser, workbenchAddress } from './browser.mjs';
import { installEditor, pause, startEditor } from './code-server.mjs';

const THEMES = {
  light: 'Light Modern',
  dark: 'Dark Modern',
  'high-contrast': 'Dark High Contrast',
  'high-contrast-light': 'Light High Contrast',
};

const root = join(dirname(fileURLToPath(import.meta.url)), '../..');
const vsix = join(root, 'out/tautline.vsix');
const target = join(root, 'out/screenshots');
const [note = 'slip-canopy.md', words = 'sag of R1'] = process.argv.slice(2);

mkdirSync(target, { recursive: true });
const main = installEditor(root);
const browser = await openBrowser();
for (const [name, theme] of Object.entries(THEMES)) await picture(name, theme);
await browser.close();

async function picture(name, theme) {
  const work = mkdtempSync(join(tmpdir(), 'tautline-pictures-'));
  const folder = join(work, 'boathouse');
  cpSync(join(root, 'media/sample'), folder, { recursive: true });
  const settings = {
    'workbench.startupEditor': 'none',
    'workbench.secondarySideBar.defaultVisibility': 'hidden',
    'workbench.activityBar.location': 'hidden',
    'chat.disableAIFeatures': true,
    'editor.minimap.enabled': false,
    'window.commandCenter': false,
    // biome-ignore lint/suspicious/noTemplateCurlyInString: the editor's own placeholder
    'window.title': '${activeEditorShort}',
    'editor.stickyScroll.enabled': false,
    'editor.fontSize': 13,
    'editor.hover.delay': 100,
    'git.enabled': false,
  };
  const server = await startEditor(main, { settings, vsix });
  try {
    const page = await browser.newPage({ viewport: { width: 1680, height: 1050 } });
    await page.goto(workbenchAddress(server.port, { folder }));
    await page.locator('.monaco-workbench').waitFor();
    await pause(3000);
    await pick(page, 'F1', '>Preferences: Color Theme', /^Preferences: Color Theme/);
    await pick(page, undefined, theme, theme);
    await pick(page, 'Control+p', note, note);
    await page.locator('.monaco-editor .view-line').first().waitFor();
    await page.keyboard.press('Control+b');
    await pause(500);
    await page.keyboard.press('Control+k');
    await page.keyboard.press('v');
    await previewOf(page);
    await page.screenshot({ path: join(target, `${name}.png`) });
    await rest(page, words);
    await page.screenshot({ path: join(target, `${name}-hover.png`) });
    console.log(`out/screenshots/${name}.png`);
    await page.close();
  } finally {
    await server.stop();
    rmSync(work, { recursive: true, force: true });
  }
}

/** Opens a quick pick with a key (or takes the one that is open), types the words and takes the row that says `row`. */
async function pick(page, key, words, row) {
  if (key !== undefined) await page.keyboard.press(key);
  const input = page.locator('.quick-input-widget input').last();
  await input.waitFor();
  await pause(500);
  await input.fill(words);
  await page.locator('.quick-input-list .monaco-list-row').filter({ hasText: row }).first().click();
  await pause(500);
}

/** The preview lies in nested frames; it is there when one of them has a drawing. */
async function previewOf(page) {
  const end = Date.now() + 20_000;
  while (Date.now() < end) {
    for (const frame of page.frames()) {
      const drawn = await frame
        .locator('.tautline svg')
        .count()
        .catch(() => 0);
      if (drawn > 0) return pause(500);
    }
    await pause(250);
  }
  throw new Error('the preview shows no drawing');
}

/** Brings the words into view and rests the pointer on the end of them. */
async function rest(page, sought) {
  await page
    .locator('.monaco-editor')
    .first()
    .click({ position: { x: 300, y: 200 } });
  await page.keyboard.press('Control+f');
  await page.keyboard.type(sought);
  await pause(400);
  await page.keyboard.press('Escape');
  await pause(300);
  const line = page.locator('.monaco-editor .view-line', { hasText: sought.replaceAll(' ', ' ') }).first();
  const at = await line.evaluate((element, text) => {
    const walker = document.createTreeWalker(element, NodeFilter.SHOW_TEXT);
    let seen = '';
    for (let node = walker.nextNode(); node !== null; node = walker.nextNode()) {
      const plain = node.data.replace(/\u00a0/g, ' ');
      const end = (seen + plain).indexOf(text) + text.length;
      if (end >= text.length && end <= seen.length + plain.length) {
        const range = document.createRange();
        range.setStart(node, end - seen.length - 1);
        range.setEnd(node, end - seen.length);
        const { left, width, top, height } = range.getBoundingClientRect();
        return { x: left + width / 2, y: top + height / 2 };
      }
      seen += plain;
    }
    return undefined;
  }, sought);
  if (at === undefined) throw new Error(`the editor does not show ${sought}`);
  await page.mouse.move(at.x - 3, at.y);
  await page.mouse.move(at.x, at.y);
  await page.locator('.monaco-hover:visible').first().waitFor();
  await pause(1200);
}
