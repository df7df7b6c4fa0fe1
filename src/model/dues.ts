// The kinds of figure that statements of many sorts ask for.
import { ANGLE, DIMENSIONLESS, LENGTH } from '../quantity/dimension.ts';
import type { Due } from './figures.ts';

export const A_LENGTH: Due = { dimension: LENGTH, words: 'a length' };
export const AN_ANGLE: Due = { dimension: ANGLE, words: 'an angle' };
export const A_NUMBER: Due = { dimension: DIMENSIONLESS, words: 'a number' };
