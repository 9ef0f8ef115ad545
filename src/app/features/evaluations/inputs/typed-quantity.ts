import { formatInput } from '@shared/model/quantity-format';

import type { TypedQuantity } from '../../../ui/quantity-field/quantity-field';

/** What a quantity field holds; null while it holds none. */
export type Typed = TypedQuantity | null;

/** A stored number as its field shows it. */
export function typed(value: number | undefined, unit: string): Typed {
  if (value === undefined) return null;
  // A duration that people say in seconds keeps them: 0.25 s, not 250 ms.
  const isInSeconds = unit === 's' && value >= 0.01;
  return { value, text: isInSeconds ? `${value} s` : formatInput(value, unit) };
}
