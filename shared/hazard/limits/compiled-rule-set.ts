import { inBand, factorRowAt } from '../factors/factor-value';
import type { Mechanism, Side } from '../result';
import type {
  Band,
  DurationRow,
  EyeRow,
  FactorRow,
  FactorSymbol,
  LimitRow,
  Provenance,
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
  /** Edges of the band; NaN where they are named break times. */
  readonly fromS: number;
  readonly toS: number;
  /** Whether an edge is a named break time, or the row holds for some sources only. */
  readonly isConditional: boolean;
  /** Numbers of the SI: J/m² or W/m². */
  readonly coefficient: number;
  readonly plus: number;
  readonly timeExponent: number;
  /** Printed as an irradiance, which a radiant exposure divides by its duration. */
  readonly isIrradiance: boolean;
  /** The printed factors that depend on wavelength; one without a row is 1. */
  readonly factors: readonly PrintedFactor[];
  /** Those that are not constant in this band; the constant ones are in the coefficient. */
  readonly varyingFactors: readonly FactorRow[];
  readonly growsWithSource: boolean;
  readonly hasT2: boolean;
  /** Averaged over the skin's aperture although it is a limit of the eye. */
  readonly isAnteriorCap: boolean;
  readonly apertures: readonly DurationRow[];
  readonly tissue: Tissue;
  /** Whether the row, a factor or an aperture was written down with less than high certainty. */
  readonly isUncertain: boolean;
}

/** A factor of a printed row with its own row in this wavelength band. */
export interface PrintedFactor {
  readonly symbol: WavelengthSymbol;
  readonly row: FactorRow | undefined;
}

/** The factors that depend on wavelength alone. */
export type WavelengthSymbol = Exclude<FactorSymbol, 'CE' | 'T2^-1/4'>;

/** What adds up with what: exposures of one tissue do. */
export type Tissue =
  | 'cornea'
  | 'cornea and lens'
  | 'retina, thermal'
  | 'retina, photochemical'
  | 'skin, ultraviolet'
  | 'skin';

/** The rows of one wavelength band, cut at every duration where one begins or ends. */
export interface DurationCells {
  /** Where each cell begins, s, ascending. */
  readonly edgesS: readonly number[];
  readonly cells: readonly DurationCell[];
}

/** The rows that can apply between two durations. */
export interface DurationCell {
  readonly rows: readonly CompiledRow[];
  /** Whether some of them depend on more than the duration. */
  readonly isConditional: boolean;
}

/** Everything that one wavelength band of one side needs. */
export interface WavelengthBand {
  readonly smallSource: DurationCells;
  readonly extendedSource: DurationCells;
  readonly isRetinal: boolean;
  readonly alphaMax: readonly DurationRow[];
  readonly gammaPh: readonly DurationRow[];
  readonly t1: FactorRow | undefined;
  readonly ti: FactorRow | undefined;
  readonly pulseTrain: readonly PulseTrainRow[];
  /** Whether the rule for pulse trains was written down with less than high certainty. */
  readonly hasUncertainTrain: boolean;
}

/** The tables of one side, cut at every wavelength where something changes. */
export interface CompiledTable {
  /** Lower edges of the bands, nm, ascending. */
  readonly edgesNm: readonly number[];
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
export function bandAt({ edgesNm, bands }: CompiledTable, wavelengthNm: number): WavelengthBand {
  return bands[lastEdgeUpTo(edgesNm, wavelengthNm)] as WavelengthBand;
}

/** The cell of a duration inside the range of the tables. */
export function cellAt({ edgesS, cells }: DurationCells, durationS: number): DurationCell {
  return cells[lastEdgeUpTo(edgesS, durationS)] as DurationCell;
}

/** The index of the last edge that is not above a value; the first one when all are. */
function lastEdgeUpTo(edges: readonly number[], value: number): number {
  let low = 0;
  let high = edges.length;
  while (high - low > 1) {
    const middle = (low + high) >>> 1;
    if (value >= (edges[middle] as number)) low = middle;
    else high = middle;
  }
  return low;
}

/** The band of a table that is being compiled. */
interface BandPlace {
  readonly ruleSet: RuleSet;
  readonly side: Side;
  /** A wavelength of the band, which stands for all of them. */
  readonly fromNm: number;
}

function compileTable(ruleSet: RuleSet, side: Side): CompiledTable {
  const edgesNm = wavelengthEdges(ruleSet, side);
  const bands = edgesNm.map((fromNm) => compileBand({ ruleSet, side, fromNm }));
  return { edgesNm, bands };
}

function compileBand(place: BandPlace): WavelengthBand {
  const { ruleSet, side, fromNm } = place;
  const { factors, eyeSmallSource, eyeExtendedSource, skin } = ruleSet;
  const compile = (table: readonly EyeRow[]) =>
    durationCells(rowsInside(table, fromNm).flatMap((row) => compileRows(place, row)));
  const hasTrainFactor = side === 'eye' || ruleSet.pulseTrain.coversSkin;
  const pulseTrain = hasTrainFactor ? rowsInside(factors.CP, fromNm) : [];
  const ti = factorRowAt(factors.Ti, fromNm);
  return {
    smallSource: compile(side === 'eye' ? eyeSmallSource : skin),
    extendedSource: compile(side === 'eye' ? eyeExtendedSource : skin),
    isRetinal: side === 'eye' && fromNm >= 400 && fromNm < 1400,
    alphaMax: rowsInside(factors.alphaMax, fromNm),
    gammaPh: rowsInside(factors.gammaPh, fromNm),
    t1: factorRowAt(factors.T1, fromNm),
    ti,
    pulseTrain,
    hasUncertainTrain: [...pulseTrain, ...(ti ? [ti] : [])].some(isUncertain),
  };
}

function durationCells(rows: readonly CompiledRow[]): DurationCells {
  const starts = rows.flatMap(({ fromS, toS }) => [fromS, toS]);
  const edgesS = [...new Set(starts)].filter((edge) => edge < LONGEST_S).sort((a, b) => a - b);
  const cells = edgesS.map((edgeS): DurationCell => {
    // Named edges are not numbers; a row that has one can apply on either side of it.
    const inCell = rows.filter(({ fromS, toS }) => !(edgeS < fromS) && !(edgeS >= toS));
    return { rows: inCell, isConditional: inCell.some((row) => row.isConditional) };
  });
  return { edgesS, cells };
}

/** Whether a row was written down with less than high certainty. */
export function isUncertain({ confidence }: Provenance): boolean {
  return confidence === 'memory-low' || confidence === 'memory-medium';
}

function rowsInside<T extends { readonly wavelengthNm: Band }>(
  rows: readonly T[],
  fromNm: number,
): T[] {
  return rows.filter((row) => inBand(fromNm, row.wavelengthNm));
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

/** A row as it is printed; a reference to the skin stands for each row of the skin in its durations. */
function compileRows(place: BandPlace, row: EyeRow): CompiledRow[] {
  if (!('sameAs' in row)) return [compileRow(place, row)];
  return rowsInside(place.ruleSet.skin, place.fromNm)
    .filter((skinRow) => Number(skinRow.durationS[1]) > Number(row.durationS[0]))
    .map((skinRow) => compileRow(place, skinRow, row));
}

const PER_M2: Record<Quantity, number> = { 'J/m2': 1, 'W/m2': 1, 'J/cm2': 1e4, 'W/cm2': 1e4 };

function compileRow(
  { ruleSet, side, fromNm }: BandPlace,
  row: LimitRow,
  reference?: SkinReferenceRow,
): CompiledRow {
  const symbols = row.factors ?? [];
  const factors = symbols
    .filter((symbol) => symbol !== 'CE' && symbol !== 'T2^-1/4')
    .map((symbol) => ({ symbol, row: factorRowAt(ruleSet.factors[symbol], fromNm) }));
  const factorRows = factors.map((factor) => factor.row).filter((found) => found !== undefined);
  const constant = factorRows
    .filter((factor) => factor.decadesPerNm === undefined)
    .reduce((product, factor) => product * factor.coefficient, PER_M2[row.quantity]);
  const mechanism = reference?.mechanism ?? row.mechanism;
  const isAnteriorCap = reference !== undefined || row.aperture === 'skin';
  const [fromS, toS] = row.durationS.map(Number) as [number, number];
  const apertures = rowsInside(ruleSet.apertures[isAnteriorCap ? 'skin' : side], fromNm);
  return {
    printed: row,
    reference,
    mechanism,
    fromS,
    toS,
    isConditional: Number.isNaN(fromS) || Number.isNaN(toS) || row.sourceMrad !== undefined,
    coefficient: row.coefficient * constant,
    plus: (row.plus ?? 0) * constant,
    timeExponent: row.timeExponent ?? 0,
    isIrradiance: row.quantity.startsWith('W'),
    factors,
    varyingFactors: factorRows.filter((factor) => factor.decadesPerNm !== undefined),
    growsWithSource: symbols.includes('CE'),
    hasT2: symbols.includes('T2^-1/4'),
    isAnteriorCap,
    apertures,
    tissue: tissueOf(side, fromNm, mechanism),
    isUncertain: [row, reference ?? row, ...factorRows, ...apertures].some(isUncertain),
  };
}

/** @source bgi-832:1 */
function tissueOf(side: Side, wavelengthNm: number, mechanism: Mechanism): Tissue {
  if (side === 'skin') return wavelengthNm < 315 ? 'skin, ultraviolet' : 'skin';
  if (wavelengthNm < 315) return 'cornea';
  if (wavelengthNm < 400 || wavelengthNm >= 1400) return 'cornea and lens';
  if (mechanism === 'corneal') return 'cornea and lens';
  return mechanism === 'photochemical' ? 'retina, photochemical' : 'retina, thermal';
}
