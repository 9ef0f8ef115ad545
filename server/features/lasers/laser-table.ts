import type { LaserState } from '@shared/workflow/laser-life-cycle';

import type { Flag } from '../../db/database';

export interface LaserTable {
  /** Row of the search index; counts up with registration. */
  number: number;
  id: string;
  tag: string;
  /** The tag with its numbers padded, so that L-2 comes before L-10. */
  tag_key: string;
  maker: string;
  model: string;
  serial: string | null;
  /** The serial without case, spaces and dashes: what a duplicate is found by. */
  serial_key: string | null;
  area_id: string | null;
  supervisor_id: string | null;
  alternate_id: string | null;
  department: string | null;
  declared_class: string | null;
  verified_class: string | null;
  class_rank: number;
  shortest_nm: number;
  /** JSON: the whole `LaserInput`. The columns above repeat what is sorted, filtered or joined. */
  record: string;
  state: LaserState;
  state_since: string;
  quarantine: Flag;
  /** When it was first released for use. */
  released_at: string | null;
  waiver: string | null;
  waiver_until_on: string | null;
  block: string | null;
  transfer_area_id: string | null;
  disposal_asked_by: string | null;
  /** none, open (a draft, in check, checked), approved or stale: the best that there is. */
  evaluation_state: EvaluationStanding;
  review_on: string | null;
  reach: string | null;
  /** From the reach; -1 when unknown. */
  eye_distance_m: number;
  optical_density: number;
  attention_rank: number;
  created_by: string | null;
  created_at: string;
  updated_at: string;
  version: number;
}

export type EvaluationStanding = 'none' | 'open' | 'approved' | 'stale';

/** Attention rank of a laser that nothing waits for. */
export const NO_ATTENTION = 99;

export interface LaserLineTable {
  laser_number: number;
  position: number;
  from_nm: number;
  to_nm: number;
}

/** FTS5; `rowid` is the laser's number. */
export interface LaserSearchTable {
  rowid: number;
  tag: string;
  serial: string;
  maker: string;
  model: string;
}

export interface LaserPlaceTable {
  laser_id: string;
  since_at: string;
  area_id: string | null;
}

export interface LaserFileTable {
  id: string;
  laser_id: string;
  kind: string;
  name: string;
  media_type: string;
  size_bytes: number;
  sha256: string;
  note: string | null;
  uploaded_by: string;
  uploaded_at: string;
  removed_at: string | null;
}

declare module '../../db/database' {
  interface Database {
    lasers: LaserTable;
    laser_lines: LaserLineTable;
    laser_search: LaserSearchTable;
    laser_places: LaserPlaceTable;
    laser_files: LaserFileTable;
  }
}
