// What may stand at the cursor of a statement that is being typed, in a table: the first row that fits is offered.
import type { StatementKind } from '../language/syntax.ts';
import { SHAPES, VALUE_WORDS } from '../language/words.ts';
import type { Namespace } from '../note/result.ts';

export type Offer =
  | { readonly names: Namespace }
  | { readonly words: readonly string[] }
  /** Every measure with its help. */
  | { readonly measures: true };

/** `before`: the statement from its keyword up to the word being typed. */
export function offersAt(keyword: StatementKind, before: string): readonly Offer[] {
  // Inside a quoted text there is nothing to offer.
  if ((before.match(/"/g)?.length ?? 0) % 2 === 1) return [];
  const row = ROWS.find(({ of, behind }) => (of === undefined || of.includes(keyword)) && behind.test(before));
  return row?.offers ?? [];
}

interface Row {
  /** Statements that the row is for; all when absent. */
  readonly of?: readonly StatementKind[];
  readonly behind: RegExp;
  readonly offers: readonly Offer[];
}

const names = (...namespaces: readonly Namespace[]): Offer[] => namespaces.map(namespace => ({ names: namespace }));
const words = (text: string): Offer => ({ words: text.split(' | ') });

const VALUES: readonly Offer[] = [...names('value', 'result'), { words: VALUE_WORDS }];
const FREED = words('axial | shear | moment');
const SUPPORTS = words('pinned | roller | fixed | guided | hold | spring | bears only');
const SECTION_KEYS = words('turned | I | A | EI | EA | GAs | depth | modulus | shear-area');
const MATERIAL_KEYS = words('E | G | density | alpha | fy');
const SHOWN = words('inputs | drawing | results | reactions | working of | contributions to | envelope of');
const DISPLAY = words('metric | us | force | length | deflection | moment | stress | rotation | line load');
const LOAD_HEADS = words('self-weight | heat | move | lengthen | shorten');
const LOAD_WORDS = words(
  'up | down | left | right | clockwise | anticlockwise | towards | square | along | on | at | at every | from | to | patterned',
);
const QUESTION_WORDS = words('at | of | in | between | under');

/** What stands behind the colon of each statement. */
const BODY: Readonly<Partial<Record<StatementKind, readonly Offer[]>>> = {
  member: names('point'),
  bar: names('point'),
  bars: names('point'),
  group: names('member'),
  point: VALUES,
  support: [SUPPORTS],
  load: [LOAD_HEADS, ...VALUES],
  section: [{ words: Object.keys(SHAPES) }, ...names('material', 'section'), SECTION_KEYS],
  material: [MATERIAL_KEYS],
  combine: names('case', 'value'),
  find: [{ measures: true }, ...VALUES],
  require: [{ measures: true }, ...VALUES],
  display: [DISPLAY],
  assume: [words('shear deformation | axially stiff')],
  show: [SHOWN, { measures: true }],
  release: [FREED],
  carry: [words('reaction of')],
};

const ROWS: readonly Row[] = [
  // Words that say what follows, whatever the statement.
  { behind: /\bunder\s+$/, offers: [...names('combination', 'case'), words('all')] },
  { of: ['load'], behind: /\bon\s+$/, offers: [...names('member'), words('plan')] },
  { behind: /\b(?:in|on)\s+$/, offers: names('member') },
  { behind: /\bof\s+$/, offers: names('member', 'section', 'material', 'structure') },
  { behind: /(?:--|\b(?:at|onto|from|to|between|and|towards))\s*$/, offers: names('point') },
  { behind: /\bspan\(\s*$/, offers: names('result') },
  { behind: /\b(?:length|along|plan|height)\([^()]*$/, offers: names('point', 'member') },
  // Heads.
  { of: ['support', 'hinge', 'connection', 'release'], behind: /^[a-z]+\s+$/, offers: names('point') },
  { of: ['load', 'case'], behind: /^[a-z]+\s+$/, offers: names('case') },
  { of: ['member', 'bar', 'bars'], behind: /^[^:]*,\s*$/, offers: names('section') },
  // Bodies, and what goes on behind a comma or a sign.
  ...Object.entries(BODY).map(([keyword, offers]) => ({
    // The keys of the table above.
    of: [keyword as StatementKind],
    behind: /:\s*$/,
    offers,
  })),
  { of: ['support'], behind: /,\s*$/, offers: [SUPPORTS] },
  { of: ['release'], behind: /,\s*$/, offers: [FREED] },
  { of: ['section'], behind: /,\s*$/, offers: [...names('material'), SECTION_KEYS] },
  { of: ['material'], behind: /,\s*$/, offers: [MATERIAL_KEYS] },
  { of: ['group', 'load'], behind: /,\s*$/, offers: names('member') },
  { of: ['show'], behind: /,\s*$/, offers: [SHOWN] },
  { of: ['combine'], behind: /:.*[\s+-]$/, offers: names('case', 'value') },
  { of: ['find', 'require'], behind: /[<>≤≥]=?\s*$/, offers: [words('span'), ...VALUES] },
  { of: ['find', 'require'], behind: /:.*[-+*/(]\s*$/, offers: [{ measures: true }, ...VALUES] },
  { behind: /[-+*/^(=]\s*$/, offers: VALUES },
  { of: ['load'], behind: /:.*\S\s+$/, offers: [LOAD_WORDS] },
  { of: ['find', 'require', 'show'], behind: /:.*\S\s+$/, offers: [QUESTION_WORDS] },
];
