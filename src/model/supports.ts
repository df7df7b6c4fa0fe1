// Supports as restraints: what is held or sprung at a point, and the symbol that a drawing shows for it.
import type { StatementOf, SupportItem } from '../language/syntax.ts';
import { divideDimensions, FORCE, LENGTH, MOMENT } from '../quantity/dimension.ts';
import type { Range } from '../quantity/range.ts';
import { AN_ANGLE } from './dues.ts';
import type { Due, Figures } from './figures.ts';
import type { Geometry } from './geometry.ts';
import { cleanCosine, cleanSine } from './headings.ts';
import type { Report } from './report.ts';
import type { Scope } from './scope.ts';
import type { Restraint, Support, SupportSymbol } from './structure.ts';

const MOVEMENT_STIFFNESS: Due = {
  dimension: divideDimensions(FORCE, LENGTH),
  words: 'a stiffness in force per length',
};
const ROTATION_STIFFNESS: Due = { dimension: MOMENT, words: 'a stiffness in moment per radian' };

const X: Restraint = { freedom: { kind: 'movement', x: 1, y: 0 }, stiffness: Infinity };
const Y: Restraint = { freedom: { kind: 'movement', x: 0, y: 1 }, stiffness: Infinity };
const ROTATION: Restraint = { freedom: { kind: 'rotation' }, stiffness: Infinity };

export function readSupports(scope: Scope, geometry: Geometry, figures: Figures, report: Report): Support[] {
  const supports: Support[] = [];
  const stands = new Map<number, StatementOf<'support'>>();
  for (const statement of scope.statements) {
    if (statement.kind !== 'support') continue;
    const point = geometry.pointNamed.get(statement.point.text);
    if (point === undefined) {
      report.flawed = true;
      continue;
    }
    const first = stands.get(point);
    if (first !== undefined) {
      report.flawed = true;
      report.error('defined-twice', statement.point.range, `${statement.point.text} has a support already.`, {
        hint: 'say all that holds it in one line',
        related: [{ range: first.point.range, message: 'The first one.' }],
      });
      continue;
    }
    stands.set(point, statement);
    const support = readSupport(statement, point, figures, report);
    if (support === undefined) report.flawed = true;
    else supports.push(support);
  }
  return supports;
}

function readSupport(
  statement: StatementOf<'support'>,
  point: number,
  figures: Figures,
  report: Report,
): Support | undefined {
  const restraints: Restraint[] = [];
  const springs: ('x' | 'y' | 'rotation')[] = [];
  let kind: SupportSymbol['kind'] = 'held';
  let angle = 0;
  let onlyBears: Range | undefined;
  let sound = true;
  for (const item of statement.items) {
    switch (item.kind) {
      case 'pinned':
        restraints.push(X, Y);
        kind = 'pinned';
        break;
      case 'fixed':
        restraints.push(X, Y, ROTATION);
        kind = 'fixed';
        break;
      case 'guided':
        restraints.push(X, ROTATION);
        kind = 'guided';
        break;
      case 'hold':
        for (const freedom of item.freedoms) restraints.push({ x: X, y: Y, rotation: ROTATION }[freedom]);
        break;
      case 'roller': {
        const surface = item.on === undefined ? 0 : figures.number(item.on, AN_ANGLE);
        if (surface === undefined) sound = false;
        else {
          angle = surface;
          kind = 'roller';
          const normal = { kind: 'movement', x: 0 - cleanSine(surface), y: cleanCosine(surface) } as const;
          restraints.push({ freedom: normal, stiffness: Infinity });
        }
        break;
      }
      case 'spring': {
        const spring = readSpring(item, figures, report);
        if (spring === undefined) sound = false;
        else {
          restraints.push(spring);
          springs.push(item.freedom);
        }
        break;
      }
      case 'bears-only':
        onlyBears = item.range;
        break;
    }
  }
  const bears = onlyBears === undefined ? undefined : pushOf(kind, restraints);
  if (onlyBears !== undefined && bears === undefined && sound) {
    sound = false;
    report.error('bad-support', onlyBears, `Which way ${statement.point.text} would bear cannot be told.`, {
      hint: 'write roller, or roller on an angle, which bears at right angles to its surface',
    });
  }
  const symbol = { kind, angle, springs };
  const common = { point, restraints, symbol, range: statement.point.range };
  return sound ? { ...common, ...(bears === undefined ? {} : { bears }) } : undefined;
}

/** A roller pushes at right angles to its surface, any other support upwards. */
function pushOf(
  kind: SupportSymbol['kind'],
  restraints: readonly Restraint[],
): { readonly x: number; readonly y: number } | undefined {
  const resisted = restraints.flatMap(({ freedom }) => (freedom.kind === 'movement' ? [freedom] : []));
  const [first] = resisted;
  if (kind === 'roller' && first !== undefined) return { x: first.x, y: first.y };
  return resisted.some(({ y }) => y !== 0) ? { x: 0, y: 1 } : undefined;
}

function readSpring(
  item: Extract<SupportItem, { kind: 'spring' }>,
  figures: Figures,
  report: Report,
): Restraint | undefined {
  const due = item.freedom === 'rotation' ? ROTATION_STIFFNESS : MOVEMENT_STIFFNESS;
  const stiffness = figures.number(item.stiffness, due);
  if (stiffness === undefined) return undefined;
  if (stiffness <= 0) {
    report.error('bad-support', item.stiffness.range, 'A spring has a stiffness greater than zero.', {
      hint: stiffness === 0 ? 'leave out a spring that holds nothing' : 'write the stiffness without a sign',
    });
    return undefined;
  }
  const freedom: Restraint['freedom'] = {
    x: { kind: 'movement', x: 1, y: 0 } as const,
    y: { kind: 'movement', x: 0, y: 1 } as const,
    rotation: { kind: 'rotation' } as const,
  }[item.freedom];
  return { freedom, stiffness };
}
