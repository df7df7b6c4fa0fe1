// The syntax tree of a note's fences: one statement a logical line, every part with its range in the note's text.
import type { Expression } from '../quantity/expression.ts';
import type { Quantity } from '../quantity/quantity.ts';
import type { Range } from '../quantity/range.ts';

/** A name as used or defined. `text` is normalised to NFC; `range` covers the words as written. */
export interface Name {
  readonly text: string;
  readonly range: Range;
}

/** A quoted text; `text` is without the quotes, `range` with them. */
export interface Quoted {
  readonly text: string;
  readonly range: Range;
}

// Values

export type Value = Expression<Operand>;

export type ExtentFunction = 'length' | 'along' | 'plan' | 'height' | 'span';

export type Operand =
  /** A number, or a number with units: `4.8 m`, `12 ft 6 1/2 in`, `1.35`. */
  | { readonly kind: 'quantity'; readonly quantity: Quantity; readonly range: Range }
  | { readonly kind: 'constant'; readonly name: 'pi' | 'g0'; readonly range: Range }
  /** A value or a result, looked for in the structure, then in the note's head. */
  | { readonly kind: 'name'; readonly name: Name; readonly range: Range }
  /** `I of RHS`, `fm of C24`, `k of Gauge`. */
  | { readonly kind: 'property'; readonly property: Name; readonly of: Name; readonly range: Range }
  /** `length(P, Q)`, `length(M)`, `along(P, Q)`, `plan(P, Q)`, `height(P)`, `span(tip)`. */
  | {
      readonly kind: 'extent';
      readonly function: ExtentFunction;
      readonly arguments: readonly Name[];
      readonly range: Range;
    }
  /** The bare word `span`, in a limit. */
  | { readonly kind: 'span'; readonly range: Range }
  /** A measure inside an expression; only in `find` and `require`. */
  | { readonly kind: 'measure'; readonly measure: Measure; readonly range: Range };

// Places

/** `2.4 m from A towards B on R1`; without `towards`, forwards along the member (backwards from its last point). */
export interface PlaceOnMember {
  readonly kind: 'on-member';
  readonly distance: Value;
  readonly from: Name;
  readonly towards?: Name;
  readonly member: Name;
  readonly range: Range;
}

export type Place = { readonly kind: 'point'; readonly point: Name; readonly range: Range } | PlaceOnMember;

/** Where a stretch of a member begins or ends: a point, or a distance from the member's first point. */
export type End =
  | { readonly kind: 'point'; readonly point: Name; readonly range: Range }
  | { readonly kind: 'distance'; readonly distance: Value; readonly range: Range };

export interface Stretch {
  readonly from: End;
  readonly to: End;
  readonly range: Range;
}

// Measures

export type MeasureKind =
  | 'deflection'
  | 'sway'
  | 'rotation'
  | 'sag'
  | 'moment'
  | 'shear'
  | 'sagging'
  | 'hogging'
  | 'force'
  | 'tension'
  | 'compression'
  | 'stress'
  | 'reaction';

export type ReactionComponent = 'vertical' | 'horizontal' | 'moment';

export interface Measure {
  readonly kind: MeasureKind;
  readonly at?: Place;
  /** A member, bar or group. */
  readonly in?: Name;
  readonly between?: Stretch;
  /** Only for `reaction`; vertical if not said. */
  readonly component?: ReactionComponent;
  readonly range: Range;
}

/** `under all`, `under service`, `under strength (b)`, `under dead`. */
export type Under =
  | { readonly kind: 'all'; readonly range: Range }
  | { readonly kind: 'named'; readonly name: Name; readonly label?: Name; readonly range: Range };

// Members

export type Heading = 'up' | 'down' | 'left' | 'right';
export type Turn = Heading | 'clockwise' | 'anticlockwise';

/** A dimension between two points of a chain. */
export type ChainDimension =
  /** `4.8 m`, `3.2 m up`, `6 m right, 0.9 m up`: parts are added. */
  | {
      readonly kind: 'parts';
      readonly parts: readonly { readonly distance: Value; readonly heading: Heading; readonly range: Range }[];
      readonly range: Range;
    }
  /** `4.1 m at 35 deg`: length and angle from level, anticlockwise. */
  | { readonly kind: 'polar'; readonly length: Value; readonly angle: Value; readonly range: Range }
  /** `6 m right at 5.7 deg`: run and pitch, behind left or right; positive rises. */
  | {
      readonly kind: 'pitched';
      readonly run: Value;
      readonly heading: 'left' | 'right';
      readonly pitch: Value;
      readonly range: Range;
    };

export interface ChainLeg {
  readonly dimension?: ChainDimension;
  /** `of Jn`: a leg with a section of its own. */
  readonly section?: Name;
  readonly to: Name;
  readonly range: Range;
}

export interface Chain {
  readonly first: Name;
  readonly legs: readonly ChainLeg[];
  readonly range: Range;
}

// Materials and sections

export type ShapeKind = 'solid' | 'round' | 'tube' | 'box' | 'i-shape' | 'channel' | 'tee';

export type Item =
  | { readonly kind: 'turned'; readonly range: Range }
  /** One word alone: a material's name. */
  | { readonly kind: 'material'; readonly name: Name; readonly range: Range }
  /** `2 x C1`. */
  | { readonly kind: 'multiple'; readonly count: number; readonly section: Name; readonly range: Range }
  /** `solid 47 mm x 220 mm`; `taper` holds the dimensions behind `to`. */
  | {
      readonly kind: 'shape';
      readonly shape: ShapeKind;
      readonly dimensions: readonly Value[];
      readonly taper?: readonly Value[];
      readonly range: Range;
    }
  | { readonly kind: 'property'; readonly key: Name; readonly value: Value; readonly range: Range }
  /** `I wanted`. */
  | { readonly kind: 'wanted'; readonly key: Name; readonly range: Range };

// Supports

export type FreedomName = 'x' | 'y' | 'rotation';

export type SupportItem =
  | { readonly kind: 'pinned' | 'fixed' | 'guided' | 'bears-only'; readonly range: Range }
  | { readonly kind: 'roller'; readonly on?: Value; readonly range: Range }
  | { readonly kind: 'hold'; readonly freedoms: readonly FreedomName[]; readonly range: Range }
  | { readonly kind: 'spring'; readonly stiffness: Value; readonly freedom: FreedomName; readonly range: Range };

// Loads

export type LoadBody =
  | { readonly kind: 'self-weight'; readonly factor?: Value; readonly of?: readonly Name[]; readonly range: Range }
  | {
      readonly kind: 'heat';
      readonly factor?: Value;
      readonly on: readonly Name[];
      readonly by:
        | { readonly kind: 'uniform'; readonly rise: Value }
        | { readonly kind: 'gradient'; readonly above: Value; readonly below: Value };
      readonly range: Range;
    }
  | {
      readonly kind: 'move';
      readonly factor?: Value;
      readonly point: Name;
      readonly by: Value;
      readonly turn: Turn;
      readonly range: Range;
    }
  | {
      readonly kind: 'lengthen' | 'shorten';
      readonly factor?: Value;
      readonly members: readonly Name[];
      readonly by: Value;
      readonly range: Range;
    }
  /** A line load: `2.4 kN/m down on R1 from A to B`, `… on plan`, `square down on`, `along Raf towards C`. */
  | {
      readonly kind: 'line';
      readonly intensity: Value;
      readonly to?: Value;
      readonly direction:
        | { readonly kind: 'heading'; readonly heading: Heading; readonly onPlan: boolean }
        /** `2 kN/m towards 30 deg on R1`: anticlockwise from x. */
        | { readonly kind: 'angle'; readonly angle: Value; readonly onPlan: boolean }
        | { readonly kind: 'square'; readonly heading: Heading }
        | { readonly kind: 'along'; readonly towards: Name };
      readonly on: readonly Name[];
      readonly stretch?: Stretch;
      readonly patterned: boolean;
      readonly range: Range;
    }
  /** A force or a couple at one place. `turn` clockwise or anticlockwise makes it a couple. */
  | {
      readonly kind: 'point';
      readonly amount: Value;
      readonly direction:
        | { readonly kind: 'turn'; readonly turn: Turn }
        | { readonly kind: 'angle'; readonly angle: Value };
      readonly at: Place;
      readonly in?: Name;
      readonly range: Range;
    }
  /** `3.1 kN down at every 1.15 m from 0.15 m to 4.5 m on Top1`. */
  | {
      readonly kind: 'row';
      readonly amount: Value;
      readonly direction:
        | { readonly kind: 'turn'; readonly turn: Turn }
        | { readonly kind: 'angle'; readonly angle: Value };
      readonly every: Value;
      readonly stretch: Stretch;
      readonly on: Name;
      readonly range: Range;
    };

// Combinations and questions

export interface Term {
  readonly sign: '+' | '-' | '+-';
  /** 1 when absent. */
  readonly factor?: Value;
  readonly case: Name;
  readonly range: Range;
}

export type ShowBody =
  | { readonly kind: 'inputs' | 'drawing' | 'results'; readonly range: Range }
  | { readonly kind: 'reactions'; readonly under?: Under; readonly byCase: boolean; readonly range: Range }
  | {
      readonly kind: 'working';
      readonly of: Name;
      readonly by?: 'direct integration' | 'conjugate beam';
      readonly range: Range;
    }
  | { readonly kind: 'contributions'; readonly to: Name; readonly range: Range }
  | {
      readonly kind: 'field';
      readonly envelope: boolean;
      readonly measure: Measure;
      readonly under?: Under;
      readonly range: Range;
    };

export interface CarryBody {
  readonly factor?: Value;
  readonly of: Name;
  readonly at: Name;
  readonly component?: ReactionComponent;
  readonly every?: Value;
  readonly from?: Quoted;
  readonly onto:
    | { readonly kind: 'member'; readonly member: Name; readonly stretch?: Stretch }
    | { readonly kind: 'place'; readonly place: Place; readonly in?: Name };
  readonly range: Range;
}

// Statements

interface Common {
  /** The whole statement, comments and trailing blanks left out. */
  readonly range: Range;
  /** The keyword alone. */
  readonly keyword: Range;
  /** The quoted sentence at the end: its source or reason. */
  readonly source?: Quoted;
}

export type Statement = Common &
  (
    | { readonly kind: 'structure'; readonly name: Name; readonly title?: Quoted }
    | { readonly kind: 'case'; readonly name: Name; readonly title?: Quoted }
    | { readonly kind: 'use'; readonly path: Quoted }
    | { readonly kind: 'hinge'; readonly point: Name; readonly member?: Name }
    | { readonly kind: 'let'; readonly name: Name; readonly value: Value }
    | { readonly kind: 'material'; readonly name: Name; readonly items: readonly Item[] }
    | { readonly kind: 'section'; readonly name: Name; readonly items: readonly Item[] }
    | {
        readonly kind: 'member' | 'bar' | 'bars';
        readonly name: Name;
        readonly section?: Name;
        readonly chain: Chain;
        readonly only?: { readonly kind: 'pulls' | 'bears'; readonly range: Range };
      }
    | { readonly kind: 'group'; readonly name: Name; readonly members: readonly Name[] }
    | {
        readonly kind: 'point';
        readonly name: Name;
        readonly at: { readonly kind: 'coordinates'; readonly x: Value; readonly y: Value } | PlaceOnMember;
      }
    | { readonly kind: 'connection'; readonly point: Name; readonly member: Name; readonly stiffness: Value }
    | {
        readonly kind: 'release';
        readonly point: Name;
        readonly member: Name;
        readonly freed: readonly ('axial' | 'shear' | 'moment')[];
      }
    | { readonly kind: 'support'; readonly point: Name; readonly items: readonly SupportItem[] }
    | { readonly kind: 'load'; readonly case: Name; readonly body: LoadBody }
    | { readonly kind: 'combine'; readonly name: Name; readonly label?: Name; readonly terms: readonly Term[] }
    | { readonly kind: 'find'; readonly name: Name; readonly what: Value; readonly under?: Under }
    | {
        readonly kind: 'require';
        readonly name: Name;
        readonly what: Value;
        readonly under?: Under;
        readonly comparison: '<=' | '>=';
        readonly limit: Value;
      }
    | { readonly kind: 'display'; readonly setting: DisplaySetting }
    | {
        readonly kind: 'assume';
        readonly assumption:
          | { readonly kind: 'shear deformation' | 'axially stiff' }
          | { readonly kind: 'sentence'; readonly text: Quoted };
      }
    | { readonly kind: 'show'; readonly show: ShowBody }
    | { readonly kind: 'carry'; readonly carry: CarryBody }
  );

/** `units` as written, blanks normalised: `kN m`; `range` is theirs, without the name. */
export type DisplaySetting =
  | { readonly kind: 'metric' | 'us' }
  | {
      readonly kind: 'units';
      readonly units: readonly { readonly name: Name; readonly units: string; readonly range: Range }[];
    };

export type StatementKind = Statement['kind'];
export type StatementOf<K extends StatementKind> = Extract<Statement, { readonly kind: K }>;

/** One physical line of a fence: its text without the line ending, and where it starts in the note. */
export interface SourceLine {
  readonly text: string;
  readonly start: number;
}
