/** A plain decimal: digits, perhaps thousands commas, perhaps a point. No exponent, no hex, no NaN. */
export const DECIMAL = String.raw`(?:\d{1,3}(?:,\d{3})+(?:\.\d*)?|\d+(?:\.\d*)?|\.\d+)`;
/** A fraction, or a whole number and a fraction: "1/2", "3 1/2", "3-1/2". */
export const FRACTION = String.raw`(?:\d+[ -]+)?\d+ ?/ ?\d+`;
/** Either. The fraction stands first, so that "3 1/2" is not read as 3. */
export const AMOUNT = `(?:${FRACTION}|${DECIMAL})`;

const FRACTION_PARTS = /^(?:(\d+)[ -]+)?(\d+) ?\/ ?(\d+)$/;

/** The number that a text matching AMOUNT stands for; NaN for a fraction over nothing. */
export function readAmount(text: string): number {
  const fraction = FRACTION_PARTS.exec(text);
  if (fraction === null) return Number(text.replaceAll(',', ''));
  const [, whole = '0', over, under] = fraction;
  const part = Number(over) / Number(under);
  return Number.isFinite(part) ? Number(whole) + part : Number.NaN;
}

/** A finite double as the shortest plain decimal that reads back the same, never with an exponent. */
export function decimalText(value: number): string {
  const text = String(value);
  const parts = /^(-?)(\d+)(?:\.(\d+))?e([+-]\d+)$/.exec(text);
  if (parts === null) return text;
  const [, sign = '', whole = '', rest = '', exponent] = parts;
  const power = Number(exponent);
  const digits = whole + rest;
  const point = whole.length + power;
  if (point <= 0) return `${sign}0.${'0'.repeat(-point)}${digits}`;
  return `${sign}${digits.padEnd(point, '0')}`;
}
