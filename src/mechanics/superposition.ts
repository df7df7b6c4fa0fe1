// Superposition: the response to a combination from the responses to the cases, term by term.

import type { Polynomial } from './polynomial.ts';
import type { Analysis, FieldPiece, MemberField, Reaction, Solution } from './solution.ts';

/** Σ factor × case; one factor for each of the structure's cases. Only for an analysis with cases solved. */
export function combine(analysis: Analysis, factors: readonly number[]): Solution {
  return superpose(analysis, analysis.cases, factors);
}

/** What of a combination its forces cause, without what is imposed: the part that stiffness governs. */
export function loadPart(analysis: Analysis, factors: readonly number[]): Solution {
  return superpose(
    analysis,
    analysis.cases.map((whole, k) => analysis.parts[k]?.forces ?? whole),
    factors,
  );
}

/** What of a combination imposed movements, heat and lack of fit cause alone; the same however stiff the structure is as a whole, springs included. */
export function imposedPart(analysis: Analysis, factors: readonly number[]): Solution {
  const parts: Solution[] = [];
  const used: number[] = [];
  analysis.parts.forEach((part, k) => {
    if (part === undefined) return;
    parts.push(part.imposed);
    used.push(factors[k]!);
  });
  return superpose(analysis, parts, used);
}

/** Σ factor × solution, of solutions with the same pieces. */
export function superpose(analysis: Analysis, solutions: readonly Solution[], factors: readonly number[]): Solution {
  const terms: Term[] = [];
  solutions.forEach((solution, k) => {
    const factor = factors[k];
    if (factor === undefined) throw new Error(`${factors.length} factors were given for ${solutions.length} cases`);
    if (factor !== 0) terms.push({ solution, factor });
  });
  if (terms.length === 1 && terms[0]!.factor === 1) return terms[0]!.solution;
  // Without a term, zero times some case gives the pieces.
  const model = terms[0] ?? { solution: analysis.cases[0], factor: 0 };
  if (model.solution === undefined) return nothing(analysis);
  const used: readonly Term[] = terms.length > 0 ? terms : [{ solution: model.solution, factor: 0 }];
  return {
    movements: sumArrays(used),
    members: model.solution.members.map((field, m) => sumFields(field, used, m)),
    reactions: model.solution.reactions.map((_, s) => sumReactions(used, solution => solution.reactions[s]!)),
    applied: sumReactions(used, solution => solution.applied),
    // Each residual is relative to its own case; their sum bounds that of the combination, relative to its largest term.
    residual: terms.reduce((sum, { solution }) => sum + solution.residual, 0),
    largest: {
      force: terms.reduce((sum, { solution, factor }) => sum + Math.abs(factor) * (solution.largest?.force ?? 0), 0),
      moment: terms.reduce((sum, { solution, factor }) => sum + Math.abs(factor) * (solution.largest?.moment ?? 0), 0),
    },
  };
}

interface Term {
  readonly solution: Solution;
  readonly factor: number;
}

/** The response of a structure without cases. */
function nothing({ structure }: Analysis): Solution {
  const none: Reaction = { x: 0, y: 0, moment: 0 };
  const zero: Polynomial = [0];
  return {
    movements: new Float64Array(3 * structure.points.length),
    members: structure.members.map(member => ({
      pieces: member.legs.map((leg, k) => ({
        leg: k,
        start: leg.start,
        end: leg.start + leg.length,
        axialForce: zero,
        shearForce: zero,
        bendingMoment: zero,
        rotation: zero,
        axialMovement: zero,
        transverseMovement: zero,
      })),
    })),
    reactions: structure.supports.map(() => none),
    applied: none,
    residual: 0,
  };
}

function sumArrays(terms: readonly Term[]): Float64Array {
  const sum = new Float64Array(terms[0]!.solution.movements.length);
  for (const { solution, factor } of terms) {
    for (let k = 0; k < sum.length; k++) sum[k]! += factor * solution.movements[k]!;
  }
  return sum;
}

function sumReactions(terms: readonly Term[], of: (solution: Solution) => Reaction): Reaction {
  let x = 0;
  let y = 0;
  let moment = 0;
  for (const { solution, factor } of terms) {
    const reaction = of(solution);
    x += factor * reaction.x;
    y += factor * reaction.y;
    moment += factor * reaction.moment;
  }
  return { x, y, moment };
}

/** All cases have the same pieces. */
function sumFields(model: MemberField, terms: readonly Term[], member: number): MemberField {
  return {
    pieces: model.pieces.map(({ leg, start, end }, k) => {
      const sumOf = (of: (piece: FieldPiece) => Polynomial) => {
        const sum: number[] = [];
        for (const { solution, factor } of terms) {
          const polynomial = of(solution.members[member]!.pieces[k]!);
          for (let power = 0; power < polynomial.length; power++) {
            sum[power] = (sum[power] ?? 0) + factor * polynomial[power]!;
          }
        }
        return sum;
      };
      return {
        leg,
        start,
        end,
        axialForce: sumOf(piece => piece.axialForce),
        shearForce: sumOf(piece => piece.shearForce),
        bendingMoment: sumOf(piece => piece.bendingMoment),
        rotation: sumOf(piece => piece.rotation),
        axialMovement: sumOf(piece => piece.axialMovement),
        transverseMovement: sumOf(piece => piece.transverseMovement),
      };
    }),
  };
}
