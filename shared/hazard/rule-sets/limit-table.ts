import type { Mechanism } from '../result';
import type { SourceKey } from '../sources';

/** How sure a printed number is; `seen-equivalent`: read in the sibling document named by `seenIn`. */
export type Confidence =
  'seen' | 'seen-equivalent' | 'memory-high' | 'memory-medium' | 'memory-low';

/** Where a number comes from and how sure it is. Travels to the steps and the warnings. */
export interface Provenance {
  readonly source: SourceKey;
  readonly confidence: Confidence;
  /** The document in which the same number was read. */
  readonly seenIn?: SourceKey;
}

/** The quantity and unit that a table prints. */
export type Quantity = 'J/m2' | 'W/m2' | 'J/cm2' | 'W/cm2';

/** A factor of a printed limit; `T2^-1/4` is the break time T_2 to the power of -1/4. */
export type FactorSymbol = 'CA' | 'CB' | 'CC' | 'CE' | 'KL' | 'C2' | 'T2^-1/4';

/** A duration in seconds, or a break time that the rule set defines ("t up to T2"). */
export type BandEdge = number | 'T1' | 'T2';

/** Half-open: the lower edge belongs to the band, the upper one to the next. */
export type Band = readonly [from: number, to: number];

/** Where a row applies. */
interface RowBand extends Provenance {
  readonly mechanism: Mechanism;
  readonly wavelengthNm: Band;
  /**
   * Half-open like the wavelength; the end of the last band belongs to it, and so does a named
   * break time to the row that ends there, as the tables print "t ≤ T2".
   */
  readonly durationS: readonly [from: BandEdge, to: BandEdge];
  /** Where the limit applies to sources of certain sizes only, edges excluded, mrad. */
  readonly sourceMrad?: Band;
  readonly note?: string;
}

/** One printed cell: `(plus + coefficient × t^timeExponent) × Π factors`. */
export interface LimitRow extends RowBand {
  readonly quantity: Quantity;
  readonly coefficient: number;
  readonly timeExponent?: number;
  readonly factors?: readonly FactorSymbol[];
  readonly plus?: number;
  /** The limit is for the front of the eye and is averaged over the skin's aperture. */
  readonly aperture?: 'skin';
  /** The limit holds for exposed areas up to this; larger ones have a lower limit. */
  readonly exposedAreaUpToM2?: number;
}

/** "As for the skin": the limit of the skin's table, averaged over the skin's aperture. */
export interface SkinReferenceRow extends RowBand {
  readonly sameAs: 'skin';
}

/** A row of an eye table. */
export type EyeRow = LimitRow | SkinReferenceRow;

/** A named number that depends on wavelength: `plus + coefficient × 10^(decadesPerNm × (λ − originNm))`. */
export interface FactorRow extends Provenance {
  readonly wavelengthNm: Band;
  readonly coefficient: number;
  readonly decadesPerNm?: number;
  readonly originNm?: number;
  readonly plus?: number;
}

/** A named number that depends on wavelength and duration: `coefficient × t^timeExponent`. */
export interface DurationRow extends Provenance {
  readonly wavelengthNm: Band;
  readonly durationS: Band;
  readonly coefficient: number;
  readonly timeExponent?: number;
}

/**
 * One branch of the pulse-train factor: `max(coefficient × N^(-1/4), floor)`, never above 1.
 * Where no branch fits, the factor is 1.
 */
export interface PulseTrainRow extends Provenance {
  /** Pulses not longer than T_i, longer ones, or both. */
  readonly pulses: 'up to Ti' | 'longer than Ti' | 'any';
  readonly wavelengthNm: Band;
  /** The longest pulse, s. */
  readonly upToS: number;
  /** Applies only to exposures longer than this, s. */
  readonly exposureAboveS?: number;
  /** Applies only to more pulses than this. */
  readonly pulsesAbove?: number;
  /** Applies only to sources above the first and up to the second, mrad. */
  readonly sourceMrad?: readonly [above: number | 'alphaMax', upTo: number | 'alphaMax'];
  readonly coefficient: number;
  readonly floor: number;
}
