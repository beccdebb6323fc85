/** How a file writes its decimals. */
export type Decimal = '.' | ',';

const NUMBER = /^([+-]?\d+(?:[.,]\d+)?)\s*(?:°\s*)?(c|f)?$/i;

/** A number cell: its digits as written and the unit behind them. */
export interface WrittenNumber {
  digits: string;
  unit: 'C' | 'F' | null;
}

/** Reads a cell that holds one number, with or without °C or °F behind it; null for anything else. */
export function writtenNumber(text: string): WrittenNumber | null {
  const match = NUMBER.exec(text.trim().replace('\u2212', '-'));
  if (!match) return null;
  const unit = match[2]?.toUpperCase();
  return { digits: match[1] ?? '', unit: unit === 'C' || unit === 'F' ? unit : null };
}

/** The value of a written number; null when it uses the other decimal sign. */
export function numberValue({ digits }: WrittenNumber, decimal: Decimal): number | null {
  const other = decimal === '.' ? ',' : '.';
  return digits.includes(other) ? null : Number(digits.replace(',', '.'));
}

/** °C from a value in a unit. */
export function toCelsius(value: number, unit: 'C' | 'F'): number {
  return unit === 'C' ? value : ((value - 32) * 5) / 9;
}
