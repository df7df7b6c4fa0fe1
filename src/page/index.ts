// The public face of the page room: the markdown-it plugin and the printed page.
export { type TautlineOptions, tautlinePlugin, tautlinePlugin as default } from './markdown-it-plugin.ts';
export { type PrintOptions, printPage } from './print-page.ts';
