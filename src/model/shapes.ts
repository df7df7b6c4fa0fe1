// Section shapes with sharp corners: dimensions in, areas and moments out. Formulas: Young and Budynas, Roark's Formulas
// for Stress and Strain, 8th ed., Table A.1 (from memory), by adding and taking away rectangles and circles.
import type { ShapeKind } from '../language/syntax.ts';

/** All lengths in m. Bending is about the level axis of the shape as described, or about the upright one when turned. */
export interface ShapeProperties {
  readonly area: number;
  readonly secondMomentOfArea: number;
  /** The smaller of the two, m³. */
  readonly sectionModulus: number;
  /** In the plane of bending. */
  readonly depth: number;
  /** Across the plane of bending. */
  readonly width: number;
  /** What stands for the area in shear flexibility, γ = V/G shearArea. */
  readonly shearArea: number;
}

/**
 * Shares of an area that count in shear: of a rectangle, a circle and a thin tube by the energy of the stresses (Young,
 * Budynas, Sadegh, Roark's Formulas for Stress and Strain, 8th ed., section 8.10, from memory: F = 6/5, 10/9 and 2). Of
 * walls joined into a box, an I, a channel or a tee, what stands along the shear is taken: webs over the full depth, or
 * 5/6 of the flanges when turned (common practice).
 */
const IN_SHEAR = { rectangle: 5 / 6, circle: 9 / 10, tube: 1 / 2 } as const;

/** The dimensions of each shape in the order in which they are written. */
export const SHAPE_DIMENSIONS = {
  solid: ['width', 'depth'],
  round: ['depth'],
  tube: ['depth', 'wall'],
  box: ['width', 'depth', 'wall'],
  'i-shape': ['depth', 'width', 'flange', 'web'],
  channel: ['depth', 'width', 'flange', 'web'],
  tee: ['depth', 'width', 'flange', 'web'],
} as const satisfies Record<ShapeKind, readonly DimensionName[]>;

export type DimensionName = 'width' | 'depth' | 'wall' | 'flange' | 'web';

/** Why dimensions do not make a shape, in words, or undefined where they do. */
export function shapeProblem(shape: ShapeKind, dimensions: readonly number[]): string | undefined {
  const [first, second, third, fourth] = dimensions as [number, number, number, number];
  switch (shape) {
    case 'solid':
    case 'round':
      return undefined;
    case 'tube':
      return second * 2 > first ? 'the wall is thicker than the radius' : undefined;
    case 'box':
      return third * 2 > Math.min(first, second) ? 'the walls leave no hollow' : undefined;
    case 'i-shape':
    case 'channel':
      if (third * 2 > first) return 'the flanges are deeper than the section';
      return fourth > second ? 'the web is wider than the flange' : undefined;
    case 'tee':
      if (third > first) return 'the flange is deeper than the section';
      return fourth > second ? 'the web is wider than the flange' : undefined;
  }
}

export function shapeProperties(shape: ShapeKind, dimensions: readonly number[], turned: boolean): ShapeProperties {
  const [first, second, third, fourth] = dimensions as [number, number, number, number];
  switch (shape) {
    case 'solid':
      return turned ? rectangle(second, first) : rectangle(first, second);
    case 'round':
      return ring(first, 0, IN_SHEAR.circle);
    case 'tube':
      return ring(first, first - 2 * second, IN_SHEAR.tube);
    case 'box':
      return turned
        ? hollow(second, first, third, IN_SHEAR.rectangle * 2 * third * first)
        : hollow(first, second, third, 2 * third * second);
    case 'i-shape':
      return turned ? turnedI(first, second, third, fourth) : flanged(first, second, third, fourth);
    case 'channel':
      return turned ? turnedChannel(first, second, third, fourth) : flanged(first, second, third, fourth);
    case 'tee':
      return turned ? turnedTee(first, second, third, fourth) : tee(first, second, third, fourth);
  }
}

function rectangle(b: number, d: number): ShapeProperties {
  return {
    area: b * d,
    secondMomentOfArea: (b * d ** 3) / 12,
    sectionModulus: (b * d * d) / 6,
    depth: d,
    width: b,
    shearArea: IN_SHEAR.rectangle * b * d,
  };
}

function ring(outside: number, inside: number, inShear: number): ShapeProperties {
  const area = (Math.PI / 4) * (outside ** 2 - inside ** 2);
  const secondMomentOfArea = (Math.PI / 64) * (outside ** 4 - inside ** 4);
  return symmetric(area, secondMomentOfArea, outside, outside, inShear * area);
}

function hollow(b: number, d: number, wall: number, shearArea: number): ShapeProperties {
  const [bi, di] = [b - 2 * wall, d - 2 * wall];
  return symmetric(b * d - bi * di, (b * d ** 3 - bi * di ** 3) / 12, d, b, shearArea);
}

/** I-shape or channel about its strong axis: the outer rectangle less the space beside the web. */
function flanged(d: number, b: number, flange: number, web: number): ShapeProperties {
  const clear = d - 2 * flange;
  return symmetric(2 * b * flange + clear * web, (b * d ** 3 - (b - web) * clear ** 3) / 12, d, b, web * d);
}

function turnedI(d: number, b: number, flange: number, web: number): ShapeProperties {
  const clear = d - 2 * flange;
  return symmetric(
    2 * b * flange + clear * web,
    (2 * flange * b ** 3 + clear * web ** 3) / 12,
    b,
    d,
    IN_SHEAR.rectangle * 2 * flange * b,
  );
}

/** Two flanges stand on the web: levels are measured from the back of the web. */
function turnedChannel(d: number, b: number, flange: number, web: number): ShapeProperties {
  const clear = d - 2 * flange;
  return stacked(
    [
      { width: 2 * flange, from: 0, to: b },
      { width: clear, from: 0, to: web },
    ],
    b,
    d,
    IN_SHEAR.rectangle * 2 * flange * b,
  );
}

/** Levels from the face of the flange. */
function tee(d: number, b: number, flange: number, web: number): ShapeProperties {
  return stacked(
    [
      { width: b, from: 0, to: flange },
      { width: web, from: flange, to: d },
    ],
    d,
    b,
    web * d,
  );
}

function turnedTee(d: number, b: number, flange: number, web: number): ShapeProperties {
  const stem = d - flange;
  return symmetric(
    b * flange + stem * web,
    (flange * b ** 3 + stem * web ** 3) / 12,
    b,
    d,
    IN_SHEAR.rectangle * flange * b,
  );
}

function symmetric(
  area: number,
  secondMomentOfArea: number,
  depth: number,
  width: number,
  shearArea: number,
): ShapeProperties {
  return { area, secondMomentOfArea, sectionModulus: (2 * secondMomentOfArea) / depth, depth, width, shearArea };
}

interface Strip {
  readonly width: number;
  readonly from: number;
  readonly to: number;
}

/** Rectangles between two levels each, about their common centroid (parallel-axis theorem). */
function stacked(strips: readonly Strip[], depth: number, width: number, shearArea: number): ShapeProperties {
  let area = 0;
  let firstMoment = 0;
  for (const { width: b, from, to } of strips) {
    area += b * (to - from);
    firstMoment += (b * (to * to - from * from)) / 2;
  }
  const centroid = firstMoment / area;
  let secondMomentOfArea = 0;
  for (const { width: b, from, to } of strips) {
    secondMomentOfArea += (b * ((to - centroid) ** 3 - (from - centroid) ** 3)) / 3;
  }
  const sectionModulus = secondMomentOfArea / Math.max(centroid, depth - centroid);
  return { area, secondMomentOfArea, sectionModulus, depth, width, shearArea };
}
