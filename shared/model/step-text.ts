import type { Step } from '../hazard/result';
import { UNIT_SPACE } from './quantity-format';

const PRINTED_UNITS: Readonly<Record<string, string>> = {
  '1': '',
  'J/m2': 'J/m²',
  'W/m2': 'W/m²',
  m2: 'm²',
  '1/m': '1/m',
};

/** The unit of a step as it is printed; empty for a bare number. */
export function stepUnit({ unit }: Pick<Step, 'unit'>): string {
  return PRINTED_UNITS[unit] ?? unit;
}

/** The value of a step to seven digits: enough to go on by hand. */
export function stepValue({ value }: Pick<Step, 'value'>): string {
  const rounded = Number(value.toPrecision(7));
  const size = Math.abs(rounded);
  if (size !== 0 && (size < 1e-3 || size >= 1e7)) return powerText(rounded.toExponential());
  return String(rounded).replace('-', '−');
}

/** A formula whose numbers have at most ten digits; all of them stay with the step itself. */
export function shortened(formula: string): string {
  return formula.replace(/(?<![A-Za-z_\d.])\d+(?:\.\d+)?(?:e[+-]?\d+)?/gi, (number) => {
    const digits = number.replace(/e.*$/i, '').replace('.', '').replace(/^0+/, '');
    return digits.length <= 10 ? number : String(Number(Number(number).toPrecision(10)));
  });
}

function powerText(exponential: string): string {
  const [mantissa = '', exponent = ''] = exponential.replace('+', '').split('e');
  const raised = exponent.replace(/[-\d]/g, (c) => '⁰¹²³⁴⁵⁶⁷⁸⁹⁻'.charAt('0123456789-'.indexOf(c)));
  return `${mantissa.replace('-', '−')}${UNIT_SPACE}×${UNIT_SPACE}10${raised}`;
}
