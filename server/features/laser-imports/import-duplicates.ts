import type { ImportError } from '@shared/model/laser-imports';
import type { LaserInput } from '@shared/model/lasers';

import { COLUMNS } from './import-columns';
import type { PlannedLaser } from './laser-import-table';

/** Lasers of the file that claim the same serial of one maker under different tags. */
export function duplicatesInFile(planned: readonly PlannedLaser[]): ImportError[] {
  const first = new Map<string, PlannedLaser>();
  return planned.flatMap((laser) => {
    const { serial, maker } = laser.input;
    if (!serial) return [];
    const key = `${maker} ${serial.replace(/[^\p{L}\p{N}]/gu, '')}`.toUpperCase();
    const before = first.get(key);
    if (!before) {
      first.set(key, laser);
      return [];
    }
    const message = `Row ${before.rows[0]} has the same maker and serial under another tag.`;
    return [{ row: laser.rows[0] ?? 0, column: 'serial', given: serial, message }];
  });
}

/** The column and cell that a field of the record stands in. */
export function errorColumn(path: string, input: LaserInput): { column: string; given: string } {
  const column =
    LOOKED_UP[path] ?? COLUMNS.find((one) => 'field' in one && one.field === path)?.header;
  const value = input[path as keyof LaserInput];
  return {
    column: column ?? path,
    given: typeof value === 'string' && !LOOKED_UP[path] ? value : '',
  };
}

const LOOKED_UP: Readonly<Record<string, string>> = {
  areaId: 'area',
  supervisorId: 'supervisor_email',
  alternateId: 'alternate_email',
};
