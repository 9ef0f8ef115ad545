import type { Flag } from '../../db/database';

export interface PersonTable {
  id: string;
  name: string;
  email: string;
  department: string | null;
  /** JSON list of roles. */
  roles: string;
  active: Flag;
  version: number;
  created_at: string;
}

declare module '../../db/database' {
  interface Database {
    people: PersonTable;
  }
}
