import { beamOf } from '@shared/model/emission-beam';
import type { ImportError, LaserImport } from '@shared/model/laser-imports';
import {
  type Emission,
  type LaserInput,
  laserInputSchema,
  type Quantity,
} from '@shared/model/lasers';
import type { Provenance } from '@shared/model/common';

import { pathText, wordsFor } from '../../http/field-errors';
import { readCell } from './import-cell';
import { COLUMNS, type Column, type FoundColumn } from './import-columns';
import type { PlannedLaser } from './laser-import-table';

type ImportWarning = LaserImport['warnings'][number];

/** What the file names and the register knows. */
export interface Known {
  /** Area ids by code, in lower case. */
  readonly areas: ReadonlyMap<string, string>;
  /** Person ids by e-mail address, in lower case. */
  readonly people: ReadonlyMap<string, string>;
}

/** A row of the file: its number as the spreadsheet shows it, and its cells by column. */
export interface SheetRow {
  readonly row: number;
  readonly cells: readonly { readonly found: FoundColumn; readonly given: string }[];
}

interface ReadRow {
  readonly row: number;
  readonly laser: Readonly<Record<string, unknown>>;
  readonly line: Emission | undefined;
  /** What laser-level cells hold, to compare the rows of one laser. */
  readonly said: ReadonlyMap<string, string>;
}

export interface Notes {
  readonly errors: ImportError[];
  readonly warnings: ImportWarning[];
}

/** Reads one row; what is wrong goes to the notes, all of it. */
export function readRow(sheet: SheetRow, known: Known, notes: Notes): ReadRow {
  const laser: Record<string, unknown> = {};
  const numbers: Partial<Record<keyof Emission, { value: number; text?: string }>> = {};
  const words: Partial<Record<keyof Emission, unknown>> = {};
  const said = new Map<string, string>();
  let source: Provenance | undefined;
  for (const { found, given } of sheet.cells) {
    const { column, saysUnit } = found;
    const reading = readCell(given, column.cell, saysUnit);
    if (!reading.ok) {
      notes.errors.push({ row: sheet.row, column: column.header, given, ...pick(reading) });
      continue;
    }
    switch (column.of) {
      case 'laser':
        laser[column.field] = reading.value;
        said.set(column.header, given);
        break;
      case 'line':
        words[column.field] = reading.value;
        break;
      case 'quantity':
        numbers[column.field] = {
          value: Number(reading.value),
          ...(reading.text ? { text: reading.text.slice(0, 40) } : {}),
        };
        break;
      case 'source':
        source = reading.value as Provenance;
        break;
      default:
        said.set(column.header, given);
        lookUp(column, { given, row: sheet.row, laser, known, notes });
    }
  }
  const line = lineOf({ numbers, words, source }, sheet.row, notes);
  return { row: sheet.row, laser, line, said };
}

/** Rows with the same tag, or without tag the same serial, are the lines of one laser. */
export function planLasers(rows: readonly ReadRow[], notes: Notes): PlannedLaser[] {
  const groups = new Map<string, ReadRow[]>();
  for (const row of rows) {
    const key = keyOf(row);
    groups.set(key, [...(groups.get(key) ?? []), row]);
  }
  return [...groups.values()].flatMap((group) => planLaser(group, notes));
}

function keyOf({ row, laser }: ReadRow): string {
  if (laser.tag) return `tag ${String(laser.tag).toLowerCase()}`;
  if (laser.serial) return `serial ${String(laser.maker)} ${String(laser.serial)}`.toLowerCase();
  return `row ${row}`;
}

function planLaser(group: readonly ReadRow[], notes: Notes): PlannedLaser[] {
  const [first, ...others] = group;
  if (!first) return [];
  for (const other of others) compare(first, other, notes);
  const lines = group.flatMap(({ line, row }) => (line ? [{ line, row }] : []));
  if (others.length > 0) {
    for (const { row, line } of group) {
      if (!line)
        notes.errors.push(
          missing(
            row,
            'wavelength_nm',
            'A further row of a laser is a line: its wavelength is missing.',
            '532 nm',
          ),
        );
    }
  }
  const blank = { maker: '', model: '', homeBuilt: false, mobile: false, emissionSets: [] };
  const emissions = lines.map(({ line }, index) => ({ ...line, id: `line-${index + 1}` }));
  const parsed = laserInputSchema.safeParse(
    { ...blank, ...first.laser, emissions },
    { error: wordsFor },
  );
  const rows = group.map(({ row }) => row);
  if (!parsed.success) {
    for (const issue of parsed.error.issues) {
      const place = placeOf(issue.path, { rows, lineRows: lines.map(({ row }) => row) });
      const column = place.column;
      const hasOne = notes.errors.some((one) => one.row === place.row && one.column === column);
      const given = String(first.said.get(column) ?? '');
      if (!hasOne) notes.errors.push({ row: place.row, column, given, message: issue.message });
    }
    return [];
  }
  warnIncomplete(
    parsed.data,
    lines.map(({ row }) => row),
    notes,
  );
  return [{ rows, input: parsed.data }];
}

/** Further rows repeat what the first says of the laser, or leave it empty. */
function compare(first: ReadRow, other: ReadRow, notes: Notes): void {
  for (const [column, given] of other.said) {
    const before = first.said.get(column);
    if (before === given) continue;
    notes.errors.push({
      row: other.row,
      column,
      given,
      message:
        before === undefined
          ? `Row ${first.row} of the same laser leaves this empty.`
          : `Row ${first.row} of the same laser says "${before}".`,
      allowed: before === undefined ? 'nothing' : `${before}, or nothing`,
    });
  }
}

interface LineCells {
  readonly numbers: Partial<Record<keyof Emission, { value: number; text?: string }>>;
  readonly words: Partial<Record<keyof Emission, unknown>>;
  readonly source: Provenance | undefined;
}

/** The line of a row; undefined when the row has none. */
function lineOf(
  { numbers, words, source }: LineCells,
  row: number,
  notes: Notes,
): Emission | undefined {
  const hasNumbers = Object.keys(numbers).length > 0;
  if (!hasNumbers && Object.keys(words).length === 0) return undefined;
  const errorsBefore = notes.errors.length;
  const need = (fails: boolean, column: string, what: string, allowed: string) => {
    const known = notes.errors.some((error) => error.row === row && error.column === column);
    if (fails && !known) notes.errors.push(missing(row, column, what, allowed));
  };
  need(!numbers.wavelengthNm, 'wavelength_nm', 'The wavelength of the line is missing.', '532 nm');
  need(!words.mode, 'mode', 'The mode of the line is missing.', allowedIn('mode'));
  need(hasNumbers && !source, 'source', 'Say where the numbers come from.', allowedIn('source'));
  need(
    Boolean(numbers.diameterMm) && !words.diameterConvention,
    'diameter_convention',
    'A diameter means nothing without its convention.',
    allowedIn('diameter_convention'),
  );
  need(
    Boolean(numbers.divergenceMrad) && !words.divergenceConvention,
    'divergence_convention',
    'A divergence means nothing without its convention.',
    allowedIn('divergence_convention'),
  );
  need(
    Boolean(numbers.divergenceMrad) && !words.divergenceAngle,
    'divergence_angle',
    'Say whether the divergence is the full or the half angle.',
    'full, half',
  );
  const isFiber = Boolean(numbers.numericalAperture ?? numbers.modeFieldDiameterUm);
  need(
    isFiber && !words.delivery,
    'delivery',
    'The row has figures of a fiber: say how the light leaves.',
    allowedIn('delivery'),
  );
  if (notes.errors.length > errorsBefore || !source) return undefined;
  const quantities = Object.entries(numbers).map(([field, { value, text }]) => {
    const quantity: Quantity = { value, source, ...(text ? { text } : {}) };
    return [field, quantity] as const;
  });
  return {
    id: `row-${row}`,
    delivery: 'beam',
    profile: 'gaussian',
    diameterConvention: '1/e2',
    divergenceConvention: '1/e2',
    divergenceAngle: 'full',
    ...words,
    ...Object.fromEntries(quantities),
  } as Emission;
}

function allowedIn(header: string): string {
  const cell = COLUMNS.find((column) => column.header === header)?.cell;
  return cell?.is === 'choice' ? cell.of.join(', ') : '';
}

function missing(row: number, column: string, message: string, allowed: string): ImportError {
  return { row, column, given: '', message, allowed };
}

interface LookUp {
  readonly given: string;
  readonly row: number;
  readonly laser: Record<string, unknown>;
  readonly known: Known;
  readonly notes: Notes;
}

function lookUp(column: Column, { given, row, laser, known, notes }: LookUp): void {
  const isArea = column.of === 'area';
  const id = (isArea ? known.areas : known.people).get(given.toLowerCase());
  if (id !== undefined) {
    laser[isArea ? 'areaId' : column.of === 'supervisor' ? 'supervisorId' : 'alternateId'] = id;
    return;
  }
  notes.errors.push({
    row,
    column: column.header,
    given,
    message: isArea ? 'There is no area with this code.' : 'Nobody on record has this address.',
    allowed: isArea ? someOf([...known.areas.keys()]) : 'the e-mail address of a person on record',
  });
}

function someOf(codes: readonly string[]): string {
  const shown = codes.slice(0, 12).map((code) => code.toUpperCase());
  return shown.join(', ') + (codes.length > shown.length ? ' …' : '');
}

function warnIncomplete(input: LaserInput, lineRows: readonly number[], notes: Notes): void {
  input.emissions.forEach((emission, index) => {
    const at = emission.wavelengthToNm ? emission.wavelengthNm.value : undefined;
    const beam = beamOf(emission, at);
    if (beam.ok) return;
    for (const { path, message } of beam.errors) {
      const column = headerOf(path);
      notes.warnings.push({ row: lineRows[index] ?? 0, column, message });
    }
  });
}

interface Rows {
  readonly rows: readonly number[];
  readonly lineRows: readonly number[];
}

/** The cell that an issue of the contract is about. */
function placeOf(path: readonly PropertyKey[], { rows, lineRows }: Rows) {
  const [root, index, field] = path;
  if (root === 'emissions' && typeof index === 'number') {
    return { row: lineRows[index] ?? rows[0] ?? 0, column: headerOf(String(field)) };
  }
  return { row: rows[0] ?? 0, column: headerOf(pathText(path.slice(0, 1))) };
}

function headerOf(field: string): string {
  const column = COLUMNS.find((one) => 'field' in one && one.field === field);
  return column?.header ?? field;
}

function pick({ message, allowed }: { message: string; allowed: string }) {
  return { message, allowed };
}
