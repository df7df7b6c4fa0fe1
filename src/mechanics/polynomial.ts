// Polynomials of low degree as coefficient arrays: `coefficients[i]` belongs to x to the power i.

export type Polynomial = readonly number[];
