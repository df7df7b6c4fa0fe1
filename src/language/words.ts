// The words that the language keeps for itself, and the check of a name against them.

import { FUNCTION_NAMES, isFunctionName } from '../quantity/pieces.ts';
import { unitNamed } from '../quantity/units.ts';
import type { ExtentFunction, Heading, MeasureKind, ShapeKind, Turn } from './syntax.ts';

/** Words that name nothing at all. */
const NAMELESS: ReadonlySet<string> = new Set(
  'in between and all plan patterned only like without together anywhere wanted'.split(' '),
);

/** Words that end a value wherever an operand is complete, outside parentheses. */
export const VALUE_ENDS: ReadonlySet<string> = new Set(
  (
    'x y rotation up down left right clockwise anticlockwise towards square along above below ' +
    'at on onto from and to under by every'
  ).split(' '),
);

/** What each extent takes: names of points, of a member (`length`), of an earlier result (`span`). */
export const EXTENTS: Readonly<Record<ExtentFunction, { readonly counts: readonly number[]; readonly form: string }>> =
  {
    length: { counts: [1, 2], form: 'length(P, Q) or length(M)' },
    along: { counts: [2], form: 'along(P, Q)' },
    plan: { counts: [2], form: 'plan(P, Q)' },
    height: { counts: [1], form: 'height(P)' },
    span: { counts: [1], form: 'span(RESULT)' },
  };

export interface MeasureForm {
  readonly form: string;
  readonly help: string;
  readonly positive: string;
}

/** Every measure, for parsing, completion and the reference. */
export const MEASURES: Readonly<Record<MeasureKind, MeasureForm>> = {
  deflection: {
    form: 'deflection at P · deflection of M [between P and Q]',
    help: 'Vertical movement of a point, or the largest along a member.',
    positive: 'down',
  },
  sway: { form: 'sway at P · sway of M', help: 'Horizontal movement.', positive: 'right' },
  rotation: { form: 'rotation at P [in M]', help: 'Change of slope.', positive: 'anticlockwise' },
  sag: {
    form: 'sag of M [between P and Q]',
    help: 'Largest departure from the chord through P and Q, at right angles to it.',
    positive: 'towards the underside',
  },
  moment: {
    form: 'moment at P in M · moment in M [between P and Q]',
    help: 'Bending moment; without a place, the largest in size.',
    positive: 'tension on the underside',
  },
  shear: { form: 'shear at P in M · shear in M', help: 'Shear force, dM/dx.', positive: 'dM/dx' },
  sagging: {
    form: 'sagging in M [between P and Q]',
    help: 'Greatest bending moment with tension on the underside.',
    positive: 'never negative',
  },
  hogging: {
    form: 'hogging in M [between P and Q]',
    help: 'Greatest bending moment with tension on the upper side.',
    positive: 'never negative',
  },
  force: { form: 'force in M [at P]', help: 'Axial force.', positive: 'tension' },
  tension: { form: 'tension in M', help: 'Greatest tension.', positive: 'never negative' },
  compression: { form: 'compression in M', help: 'Greatest compression.', positive: 'never negative' },
  stress: { form: 'stress in M', help: 'Largest |N/A ± M/W|.', positive: 'never negative' },
  reaction: {
    form: 'reaction at P [vertical, horizontal or moment]',
    help: 'Support reaction; vertical if not said.',
    positive: 'up, right, anticlockwise',
  },
};

/** The dimensions of each shape in their order. */
export const SHAPES: Readonly<Record<ShapeKind, readonly string[]>> = {
  solid: ['width', 'depth'],
  round: ['diameter'],
  tube: ['outside diameter', 'wall'],
  box: ['width', 'depth', 'wall'],
  'i-shape': ['depth', 'width', 'flange', 'web'],
  channel: ['depth', 'width', 'flange', 'web'],
  tee: ['depth', 'width', 'flange', 'web'],
};

const HEADINGS: ReadonlySet<string> = new Set<Heading>(['up', 'down', 'left', 'right']);
const TURNS: ReadonlySet<string> = new Set<Turn>(['up', 'down', 'left', 'right', 'clockwise', 'anticlockwise']);

export function isHeading(word: string): word is Heading {
  return HEADINGS.has(word);
}

export function isTurn(word: string): word is Turn {
  return TURNS.has(word);
}

export function isMeasureKind(word: string): word is MeasureKind {
  return Object.hasOwn(MEASURES, word);
}

export function isExtentFunction(word: string): word is ExtentFunction {
  return Object.hasOwn(EXTENTS, word);
}

export function isShapeKind(word: string): word is ShapeKind {
  return Object.hasOwn(SHAPES, word);
}

export function isNameless(word: string): boolean {
  return NAMELESS.has(word);
}

export function endsValue(word: string): boolean {
  return VALUE_ENDS.has(word);
}

/** Every word that a value can hold besides names and units, for completion. */
export const VALUE_WORDS: readonly string[] = [...FUNCTION_NAMES, ...Object.keys(EXTENTS), 'pi', 'g0'];

/** Why a word may not name anything; undefined where it may. */
export function whyNoName(word: string): string | undefined {
  return isNameless(word) ? `\`${word}\` is a word of the language and names nothing.` : undefined;
}

/** Why a word may not name a value or a result, which stand among units, functions and measures. */
export function whyNoValueName(word: string): string | undefined {
  const what = unitNamed(word)
    ? 'a unit'
    : isFunctionName(word) || isExtentFunction(word)
      ? 'a function'
      : isMeasureKind(word)
        ? 'a measure'
        : word === 'pi' || word === 'g0'
          ? 'a constant'
          : undefined;
  return what ? `\`${word}\` is ${what}; a value or a result needs another name.` : whyNoName(word);
}
