import type { LaserImport } from '@shared/model/laser-imports';
import type { LaserInput } from '@shared/model/lasers';

/** A laser that the file describes, with the rows that do. */
export interface PlannedLaser {
  readonly rows: readonly number[];
  readonly input: LaserInput;
}

export interface LaserImportTable {
  id: string;
  person_id: string;
  file_name: string;
  status: LaserImport['status'];
  rows_total: number;
  rows_done: number;
  rows_good: number;
  lasers: number;
  /** JSON: the first 1,000 `ImportError`. */
  errors: string;
  error_count: number;
  /** JSON: the first 1,000 warnings. */
  warnings: string;
  /** JSON: `PlannedLaser[]`; emptied once saved or canceled. */
  plan: string;
  created_at: string;
  updated_at: string;
}

declare module '../../db/database' {
  interface Database {
    laser_imports: LaserImportTable;
  }
}
