const DECIMALS: Readonly<Record<string, number>> = { cm: 1, ms: 0, m: 2, "m/s": 2 };

/** A result of a test with its unit, to the decimals that such a test can tell apart: "41.0 cm", "1.75 m/s". */
export const measureText = (value: number, unit: string): string =>
  `${value.toFixed(DECIMALS[unit] ?? 1)} ${unit}`;
