/** The grammar of numbers, and their exact scaling by powers of ten: the exponent is moved in the text, so no product rounds. */

/** A number at the start of a text. */
export interface NumberAhead {
  /** As written, sign included. */
  readonly digits: string;
  /** What follows it, spaces kept. */
  readonly rest: string;
}

const numberPattern = /^[+-]?(?:\d+(?:\.\d+)?|\.\d+)(?:[eE][+-]?\d+)?/;

/** The number that a text begins with, or null; a number does not end in a point. */
export function numberAhead(text: string): NumberAhead | null {
  const digits = numberPattern.exec(text)?.[0];
  if (digits === undefined) return null;
  return { digits, rest: text.slice(digits.length) };
}

/** The value of a written number times 10^power, rounded once. */
export function scaled(digits: string, power: number): number {
  const [mantissa = '', exponent = '0'] = digits.split(/[eE]/);
  const value = Number(`${mantissa}e${String(Number(exponent) + power)}`);
  return value === 0 ? 0 : value;
}

/** A number as plain decimal text divided by 10^power, without loss: 24576000 and 6 give "24.576". */
export function decimalText(value: number, power: number): string {
  if (value === 0) return '0';
  const [mantissa = '', exponent = '0'] = Math.abs(value).toExponential().split('e');
  const digits = mantissa.replace('.', '');
  const point = Number(exponent) - power + 1;
  const sign = value < 0 ? '-' : '';
  if (point > 21 || point < -6) return `${sign}${mantissa}e${String(Number(exponent) - power)}`;
  if (point <= 0) return `${sign}0.${'0'.repeat(-point)}${digits}`;
  if (point >= digits.length) return sign + digits.padEnd(point, '0');
  return `${sign}${digits.slice(0, point)}.${digits.slice(point)}`;
}
