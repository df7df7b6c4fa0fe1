// What the benches say of a row of measurements.

/** The value that the share `part` of the measurements does not exceed. */
export function quantile(values, part) {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.floor(part * sorted.length))];
}

export function median(values) {
  return quantile(values, 0.5);
}
