import type { BeamModel } from '../case';
import type { DurationRow, EyeRow, FactorRow, LimitRow, PulseTrainRow } from './limit-table';

/** The symbols that an edition prints for the factors. */
export interface FactorSymbols {
  readonly CA: string;
  readonly CB: string;
  readonly CC: string;
  readonly CE: string;
  readonly CP: string;
  readonly KL: string;
  readonly C2: string;
  readonly T1: string;
  readonly T2: string;
}

/** The factors of an edition. A factor without a row is 1; without T_2, T_i or γ_ph there is none. */
export interface FactorTable {
  readonly symbols: FactorSymbols;
  readonly CA: readonly FactorRow[];
  readonly CB: readonly FactorRow[];
  readonly CC: readonly FactorRow[];
  readonly KL: readonly FactorRow[];
  readonly C2: readonly FactorRow[];
  /** The break time T_1, s. */
  readonly T1: readonly FactorRow[];
  /** The time T_i (T_min) within which pulses count as one, s. */
  readonly Ti: readonly FactorRow[];
  /** The largest angle that C_E grows with, mrad. */
  readonly alphaMax: readonly DurationRow[];
  /** The limiting cone of the photochemical limit, mrad. */
  readonly gammaPh: readonly DurationRow[];
  /** Whether the edition has the break time T_2. */
  readonly hasT2: boolean;
  readonly CP: readonly PulseTrainRow[];
}

/** What the pulse-train rule of an edition counts and covers. */
export interface PulseTrainRule {
  /** Pulses are counted within the exposure, or within T_2 when that is shorter. */
  readonly countedWithin: 'exposure' | 'T2';
  /** Whether the rule reduces the limits of the skin as well. */
  readonly coversSkin: boolean;
}

/** One edition of one document: its tables and how they are read. */
export interface RuleSet {
  readonly id: string;
  /** The document as it is cited, with its year. */
  readonly edition: string;
  readonly title: string;
  /** The id of the edition that took its place. */
  readonly supersededBy?: string;
  readonly eyeSmallSource: readonly EyeRow[];
  readonly eyeExtendedSource: readonly EyeRow[];
  readonly skin: readonly LimitRow[];
  readonly apertures: {
    readonly eye: readonly DurationRow[];
    readonly skin: readonly DurationRow[];
  };
  readonly factors: FactorTable;
  readonly pulseTrain: PulseTrainRule;
  /** The shortest duration of the tables, s; shorter pulses keep the irradiance of this one. */
  readonly shortestS: number;
  readonly defaultModel: BeamModel;
}
