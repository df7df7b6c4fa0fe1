// One drawing in the making: elements gather in layers, the words on top, and the sheet grows to hold them.
import { type Box, px, type Segment, type Spot } from './geometry.ts';
import { type FillRole, type Ink, ink, type LineRole, type Palette, type WashRole, type WordRole } from './ink.ts';
import { type Anchor, escapeText, type Label, runsToSvg, type WordSize, widthOf } from './words.ts';

export interface WordsAt {
  /** Of the baseline. */
  readonly at: Spot;
  readonly anchor?: Anchor;
  readonly size?: WordSize;
  readonly role?: WordRole;
  readonly halo?: boolean;
  /** Degrees, clockwise as SVG has it, about `at`. */
  readonly turn?: number;
}

/** From the back to the front. */
const LAYERS = ['wash', 'guide', 'back', 'line', 'symbol', 'dot'] as const;

export type Layer = (typeof LAYERS)[number];

export class Sheet {
  /** px. */
  readonly width: number;
  readonly ink: Ink;
  /** What a label should keep clear of. */
  readonly obstacles: Segment[] = [];
  /** Where words stand already. */
  readonly taken: Box[] = [];
  readonly #layers = new Map<Layer, string[]>(LAYERS.map(layer => [layer, []]));
  readonly #words: string[] = [];
  #top = Number.POSITIVE_INFINITY;
  #bottom = Number.NEGATIVE_INFINITY;

  constructor(width: number, palette: Palette) {
    this.width = width;
    this.ink = ink(palette);
  }

  line(role: LineRole, d: string, layer: Layer = 'line'): void {
    if (d !== '') this.#add(layer, `<path ${this.ink.line(role)} d="${d}"/>`);
  }

  fill(role: FillRole, d: string, layer: Layer = 'line'): void {
    if (d !== '') this.#add(layer, `<path ${this.ink.fill(role)} d="${d}"/>`);
  }

  wash(role: WashRole, d: string): void {
    this.#add('wash', `<path ${this.ink.wash(role)} d="${d}"/>`);
  }

  dot(role: FillRole, at: Spot, radius: number): void {
    this.#add('dot', `<circle ${this.ink.fill(role)} cx="${px(at.x)}" cy="${px(at.y)}" r="${px(radius)}"/>`);
    this.reach(at.y - radius, at.y + radius);
  }

  ring(at: Spot, radius: number, layer: Layer = 'dot'): void {
    this.#add(layer, `<circle ${this.ink.line('support')} cx="${px(at.x)}" cy="${px(at.y)}" r="${px(radius)}"/>`);
    this.reach(at.y - radius, at.y + radius);
  }

  /** Elements drawn elsewhere, already as SVG. */
  markup(svg: string, layer: Layer): void {
    this.#add(layer, svg);
  }

  words(label: Label, { at, anchor = 'start', size = 12, role = 'ink', halo = false, turn = 0 }: WordsAt): void {
    const attributes = [`x="${px(at.x)}" y="${px(at.y)}"`];
    if (anchor !== 'start') attributes.push(`text-anchor="${anchor}"`);
    if (size !== 12) attributes.push(`font-size="${size}"`);
    if (turn !== 0) attributes.push(`transform="rotate(${px(turn)} ${px(at.x)} ${px(at.y)})"`);
    const inside = runsToSvg(label, this.ink);
    // A rim is an element of its own class or attributes, so the colour goes on the text and the rim on its group.
    const text = `<text ${attributes.join(' ')} ${this.ink.words(role)}>${inside}</text>`;
    this.#words.push(halo ? `<g ${this.ink.halo}>${text}</g>` : text);
    for (const box of footprint(label, at, anchor, size, turn)) {
      this.taken.push(box);
      this.reach(box.top, box.bottom);
    }
  }

  /** Makes sure that the sheet shows this height. */
  reach(...heights: readonly number[]): void {
    this.#top = Math.min(this.#top, ...heights);
    this.#bottom = Math.max(this.#bottom, ...heights);
  }

  get top(): number {
    return this.#top;
  }

  get bottom(): number {
    return this.#bottom;
  }

  /** `description` is read out in place of the drawing. */
  svg(description: string): string {
    const top = Number.isFinite(this.#top) ? Math.floor(this.#top) - 1 : 0;
    const height = Number.isFinite(this.#bottom) ? Math.ceil(this.#bottom) + 1 - top : 1;
    const size = `viewBox="0 ${top} ${this.width} ${height}" width="${this.width}" height="${height}"`;
    const layers = LAYERS.map(layer => (this.#layers.get(layer) ?? []).join('')).join('');
    const root =
      this.ink.paper === undefined
        ? 'class="tl-drawing"'
        : `xmlns="http://www.w3.org/2000/svg" font-family="Arial,Helvetica,'Liberation Sans',sans-serif"`;
    const name = escapeText(description);
    return (
      `<svg ${root} ${size} role="img" aria-label="${name}" fill="none" stroke="currentColor" font-size="12">` +
      `${layers}<g stroke="none" fill="currentColor">${this.#words.join('')}</g></svg>`
    );
  }

  #add(layer: Layer, svg: string): void {
    this.#layers.get(layer)?.push(svg);
  }
}

/** What a label covers: one box, or, turned, a row of them along its baseline. */
export function footprint(label: Label, at: Spot, anchor: Anchor, size: WordSize, turn: number): Box[] {
  const width = widthOf(label, size);
  const start = anchor === 'start' ? 0 : anchor === 'middle' ? -width / 2 : -width;
  const up = size * 0.78;
  const down = size * 0.24;
  if (turn === 0) {
    return [{ left: at.x + start, top: at.y - up, right: at.x + start + width, bottom: at.y + down }];
  }
  const radians = (turn * Math.PI) / 180;
  const along: Spot = { x: Math.cos(radians), y: Math.sin(radians) };
  const middle = (down - up) / 2;
  const parts = Math.max(1, Math.ceil(width / size));
  const half = (up + down) / 2;
  return Array.from({ length: parts }, (_, i) => {
    const s = start + (width * (i + 0.5)) / parts;
    const x = at.x + along.x * s - along.y * middle;
    const y = at.y + along.y * s + along.x * middle;
    return { left: x - half, top: y - half, right: x + half, bottom: y + half };
  });
}
