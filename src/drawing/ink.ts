// What each kind of line, fill and word is drawn with. A page colours by class, so that a theme can change its mind
// afterwards; an image that sees no stylesheet carries its colours in itself.

/** `page`: classes of media/tautline.css. `light`, `dark`: colours written into the drawing. */
export type Palette = 'page' | 'light' | 'dark';

export type Hue = 'ink' | 'soft' | 'guide' | 'load' | 'bend' | 'move' | 'paper';

export type LineRole =
  | 'member'
  | 'bar'
  | 'outline' // the structure behind a field
  | 'support'
  | 'spring'
  | 'hatch'
  | 'dimension'
  | 'tick'
  | 'guide'
  | 'underside'
  | 'load'
  | 'load-base'
  | 'load-dashed' // an imposed movement
  | 'bending'
  | 'axial'
  | 'moved'
  | 'free' // the way a mechanism goes
  | 'free-arrow';

export type FillRole = 'ink' | 'load' | 'bend' | 'move' | 'paper';

/** Washes have a role of their own each: in high contrast and in black and white a pattern tells them apart. */
export type WashRole = 'load' | 'moment' | 'shear' | 'axial' | 'movement';

export type WordRole = 'ink' | 'soft' | 'load' | 'bend' | 'move';

interface Stroke {
  readonly hue: Hue;
  /** At a nominal 640 px of width. */
  readonly width: number;
  readonly dash?: string;
  readonly round?: true;
  /** Closed symbols are filled with paper, so that what runs behind them stays behind. */
  readonly closed?: true;
}

const STROKES: Readonly<Record<LineRole, Stroke>> = {
  member: { hue: 'ink', width: 2.25, round: true },
  bar: { hue: 'ink', width: 1.5, round: true },
  outline: { hue: 'ink', width: 0.75 },
  support: { hue: 'ink', width: 1.5, round: true, closed: true },
  spring: { hue: 'ink', width: 1.25, round: true },
  hatch: { hue: 'ink', width: 0.75 },
  dimension: { hue: 'soft', width: 0.75 },
  tick: { hue: 'ink', width: 1.25 },
  guide: { hue: 'guide', width: 0.75, dash: '1 3' },
  underside: { hue: 'ink', width: 0.75, dash: '4 3' },
  load: { hue: 'load', width: 1.25 },
  'load-base': { hue: 'load', width: 0.75 },
  'load-dashed': { hue: 'load', width: 1.25, dash: '3 2' },
  bending: { hue: 'bend', width: 1.25, round: true },
  axial: { hue: 'ink', width: 1.25, round: true },
  moved: { hue: 'move', width: 1.25, dash: '5 3' },
  free: { hue: 'move', width: 1.5, dash: '7 4', round: true },
  'free-arrow': { hue: 'move', width: 1.25 },
};

const WASH_HUE: Readonly<Record<WashRole, Hue>> = {
  load: 'load',
  moment: 'bend',
  shear: 'bend',
  axial: 'ink',
  movement: 'move',
};

interface Colours {
  readonly line: Readonly<Record<Hue, string>>;
  readonly word: Readonly<Record<WordRole, string>>;
  readonly wash: number;
}

// Okabe and Ito (2008), darkened for words on white and lightened on dark paper: 4.5 to 1 for words, 3 to 1 for lines.
const COLOURS: Readonly<Record<Exclude<Palette, 'page'>, Colours>> = {
  light: {
    line: {
      ink: '#3b3b3b',
      soft: '#666666',
      guide: '#8d8d8d',
      load: '#0072b2',
      bend: '#d55e00',
      move: '#009e73',
      paper: '#ffffff',
    },
    word: { ink: '#3b3b3b', soft: '#666666', load: '#0072b2', bend: '#b34d00', move: '#007a59' },
    wash: 0.12,
  },
  dark: {
    line: {
      ink: '#cccccc',
      soft: '#a6a6a6',
      guide: '#838383',
      load: '#56b4e9',
      bend: '#f58a50',
      move: '#2fc79b',
      paper: '#1f1f1f',
    },
    word: { ink: '#cccccc', soft: '#a6a6a6', load: '#56b4e9', bend: '#f58a50', move: '#2fc79b' },
    wash: 0.16,
  },
};

/** A load's wash is lighter than a field's. */
const LOAD_WASH = 0.07;

/** Each gives the attributes of an element, without a leading blank. */
export interface Ink {
  line(role: LineRole): string;
  fill(role: FillRole): string;
  wash(role: WashRole): string;
  words(role: WordRole): string;
  /** Of a word that may stand on lines: a rim of paper around it. */
  readonly halo: string;
  readonly paper: string | undefined;
}

export function ink(palette: Palette): Ink {
  return palette === 'page' ? PAGE : fixedInk(COLOURS[palette]);
}

// Without the stylesheet a page's drawing is still drawn: in the colour of the text around it.
const PAGE: Ink = {
  line: role => {
    const stroke = STROKES[role];
    return `class="tl-${stroke.hue}${stroke.closed ? ' tl-closed' : ''}" ${shape(stroke)}`;
  },
  fill: role => `class="tl-${role}-fill"${role === 'paper' ? '' : ' fill="currentColor"'} stroke="none"`,
  wash: role => `class="tl-${role}-wash" stroke="none"`,
  words: role => `class="tl-${role}-words"`,
  halo: 'class="tl-halo"',
  paper: undefined,
};

function fixedInk(colours: Colours): Ink {
  return {
    line: role => {
      const stroke = STROKES[role];
      const fill = stroke.closed ? ` fill="${colours.line.paper}"` : '';
      return `stroke="${colours.line[stroke.hue]}" ${shape(stroke)}${fill}`;
    },
    fill: role => `fill="${colours.line[role]}" stroke="none"`,
    wash: role => {
      const opacity = role === 'load' ? LOAD_WASH : colours.wash;
      return `fill="${colours.line[WASH_HUE[role]]}" fill-opacity="${opacity}" stroke="none"`;
    },
    words: role => `fill="${colours.word[role]}"`,
    halo: `paint-order="stroke" stroke="${colours.line.paper}" stroke-width="3.5" stroke-linejoin="round"`,
    paper: colours.line.paper,
  };
}

function shape(stroke: Stroke): string {
  const dash = stroke.dash === undefined ? '' : ` stroke-dasharray="${stroke.dash}"`;
  const ends = stroke.round ? ' stroke-linejoin="round"' : '';
  return `stroke-width="${stroke.width}"${dash}${ends}`;
}
