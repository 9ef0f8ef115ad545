import { inBand, factorRowAt } from '../factors/factor-value';
import type { Mechanism, Side } from '../result';
import type {
  BandEdge,
  DurationRow,
  EyeRow,
  FactorRow,
  FactorSymbol,
  LimitRow,
  PulseTrainRow,
  Quantity,
  SkinReferenceRow,
} from '../rule-sets/limit-table';
import type { RuleSet } from '../rule-sets/rule-set';

/** The longest duration of the tables, s; longer ones are read here. */
export const LONGEST_S = 3e4;

/** A printed row made ready for reading: SI, band edges resolved as far as they are numbers. */
export interface CompiledRow {
  readonly printed: LimitRow;
  /** The eye row that refers to this row of the skin. */
  readonly reference: SkinReferenceRow | undefined;
  readonly mechanism: Mechanism;
  readonly from: BandEdge;
  readonly to: BandEdge;
  /** The end of the last band belongs to it. */
  readonly endIncluded: boolean;
  /** Numbers of the SI: J/m² or W/m². */
  readonly coefficient: number;
  readonly plus: number;
  readonly timeExponent: number;
  /** Printed as an irradiance, which a radiant exposure divides by its duration. */
  readonly isIrradiance: boolean;
  /** The factors that depend on wavelength and are not constant in this band. */
  readonly wavelengthFactors: readonly FactorRow[];
  readonly growsWithSource: boolean;
  readonly hasT2: boolean;
  /** Averaged over the skin's aperture although it is a limit of the eye. */
  readonly isAnteriorCap: boolean;
  readonly tissue: Tissue;
}

/** What adds up with what: exposures of one tissue do. */
export type Tissue =
  | 'cornea'
  | 'cornea and lens'
  | 'retina, thermal'
  | 'retina, photochemical'
  | 'skin, ultraviolet'
  | 'skin';

/** Everything that one wavelength band of one side needs. */
export interface WavelengthBand {
  readonly smallSource: readonly CompiledRow[];
  readonly extendedSource: readonly CompiledRow[];
  readonly isRetinal: boolean;
  readonly apertures: readonly DurationRow[];
  readonly skinApertures: readonly DurationRow[];
  readonly alphaMax: readonly DurationRow[];
  readonly gammaPh: readonly DurationRow[];
  readonly t1: FactorRow | undefined;
  readonly ti: FactorRow | undefined;
  readonly pulseTrain: readonly PulseTrainRow[];
}

/** The tables of one side, cut at every wavelength where something changes. */
export interface CompiledTable {
  /** Lower edges of the bands, nm, ascending. */
  readonly edgesNm: Float64Array;
  readonly bands: readonly WavelengthBand[];
}

/** A rule set made ready for reading. */
export interface CompiledRuleSet {
  readonly ruleSet: RuleSet;
  readonly eye: CompiledTable;
  readonly skin: CompiledTable;
}

const compiled = new Map<RuleSet, CompiledRuleSet>();

/** The rule set made ready for reading; done once. */
export function compiledRuleSet(ruleSet: RuleSet): CompiledRuleSet {
  let result = compiled.get(ruleSet);
  if (result === undefined) {
    result = { ruleSet, eye: compileTable(ruleSet, 'eye'), skin: compileTable(ruleSet, 'skin') };
    compiled.set(ruleSet, result);
  }
  return result;
}

/** The band of a wavelength from 180 nm to 1 mm. */
export function bandAt(table: CompiledTable, wavelengthNm: number): WavelengthBand {
  const { edgesNm, bands } = table;
  let low = 0;
  let high = edgesNm.length;
  while (high - low > 1) {
    const middle = (low + high) >>> 1;
    if (wavelengthNm >= (edgesNm[middle] as number)) low = middle;
    else high = middle;
  }
  return bands[low] as WavelengthBand;
}

function compileTable(ruleSet: RuleSet, side: Side): CompiledTable {
  const edgesNm = wavelengthEdges(ruleSet, side);
  const bands = edgesNm.map((fromNm): WavelengthBand => {
    const rows = (table: readonly EyeRow[]) => compileRows(ruleSet, side, table, fromNm);
    const inside = <T extends { readonly wavelengthNm: LimitRow['wavelengthNm'] }>(
      table: readonly T[],
    ) => table.filter((row) => inBand(fromNm, row.wavelengthNm));
    const { factors, apertures } = ruleSet;
    return {
      smallSource: rows(side === 'eye' ? ruleSet.eyeSmallSource : ruleSet.skin),
      extendedSource: rows(side === 'eye' ? ruleSet.eyeExtendedSource : ruleSet.skin),
      isRetinal: side === 'eye' && fromNm >= 400 && fromNm < 1400,
      apertures: inside(apertures[side]),
      skinApertures: inside(apertures.skin),
      alphaMax: inside(factors.alphaMax),
      gammaPh: inside(factors.gammaPh),
      t1: factorRowAt(factors.T1, fromNm),
      ti: factorRowAt(factors.Ti, fromNm),
      pulseTrain: side === 'eye' || ruleSet.pulseTrain.coversSkin ? inside(factors.CP) : [],
    };
  });
  return { edgesNm: Float64Array.from(edgesNm), bands };
}

/** Every wavelength at which a row, a factor or an aperture begins. */
function wavelengthEdges(ruleSet: RuleSet, side: Side): number[] {
  const { CA, CB, CC, KL, C2, T1, Ti, alphaMax, gammaPh, CP } = ruleSet.factors;
  const limits: readonly EyeRow[] =
    side === 'eye'
      ? [...ruleSet.eyeSmallSource, ...ruleSet.eyeExtendedSource, ...ruleSet.skin]
      : ruleSet.skin;
  const rows = [
    ...limits,
    ...[CA, CB, CC, KL, C2, T1, Ti].flat(),
    ...[alphaMax, gammaPh, CP].flat(),
    ...ruleSet.apertures.eye,
    ...ruleSet.apertures.skin,
  ];
  const edges = new Set(rows.flatMap((row) => [...row.wavelengthNm]));
  edges.delete(1e6);
  return [...edges].sort((a, b) => a - b);
}

function compileRows(
  ruleSet: RuleSet,
  side: Side,
  table: readonly EyeRow[],
  fromNm: number,
): CompiledRow[] {
  return table
    .filter((row) => inBand(fromNm, row.wavelengthNm))
    .flatMap((row) => {
      if (!('sameAs' in row)) return [compileRow(ruleSet, side, row, fromNm)];
      // A reference stands for every row of the skin within its own durations.
      return ruleSet.skin
        .filter((skinRow) => inBand(fromNm, skinRow.wavelengthNm))
        .filter((skinRow) => Number(skinRow.durationS[1]) > Number(row.durationS[0]))
        .map((skinRow) => compileRow(ruleSet, side, skinRow, fromNm, row));
    });
}

const PER_M2: Record<Quantity, number> = { 'J/m2': 1, 'W/m2': 1, 'J/cm2': 1e4, 'W/cm2': 1e4 };

function compileRow(
  ruleSet: RuleSet,
  side: Side,
  row: LimitRow,
  fromNm: number,
  reference?: SkinReferenceRow,
): CompiledRow {
  const factors = row.factors ?? [];
  const factorRows = factors.flatMap((symbol) => wavelengthFactorRow(ruleSet, symbol, fromNm));
  const constant = factorRows
    .filter((factor) => factor.decadesPerNm === undefined)
    .reduce((product, factor) => product * factor.coefficient, PER_M2[row.quantity]);
  const mechanism = reference?.mechanism ?? row.mechanism;
  const isAnteriorCap = reference !== undefined || row.aperture === 'skin';
  return {
    printed: row,
    reference,
    mechanism,
    from: row.durationS[0],
    to: row.durationS[1],
    endIncluded: row.durationS[1] === LONGEST_S,
    coefficient: row.coefficient * constant,
    plus: (row.plus ?? 0) * constant,
    timeExponent: row.timeExponent ?? 0,
    isIrradiance: row.quantity.startsWith('W'),
    wavelengthFactors: factorRows.filter((factor) => factor.decadesPerNm !== undefined),
    growsWithSource: factors.includes('CE'),
    hasT2: factors.includes('T2^-1/4'),
    isAnteriorCap,
    tissue: tissueOf(side, fromNm, mechanism),
  };
}

function wavelengthFactorRow(ruleSet: RuleSet, symbol: FactorSymbol, fromNm: number): FactorRow[] {
  if (symbol === 'CE' || symbol === 'T2^-1/4') return [];
  const row = factorRowAt(ruleSet.factors[symbol], fromNm);
  return row === undefined ? [] : [row];
}

/** @source bgi-832:1 */
function tissueOf(side: Side, wavelengthNm: number, mechanism: Mechanism): Tissue {
  if (side === 'skin') return wavelengthNm < 315 ? 'skin, ultraviolet' : 'skin';
  if (wavelengthNm < 315) return 'cornea';
  if (wavelengthNm < 400 || wavelengthNm >= 1400) return 'cornea and lens';
  if (mechanism === 'corneal') return 'cornea and lens';
  return mechanism === 'photochemical' ? 'retina, photochemical' : 'retina, thermal';
}
