export interface AreaTable {
  id: string;
  code: string;
  name: string;
  building: string;
  room: string;
  department: string;
  supervisor_id: string | null;
  alternate_id: string | null;
  wall_distance_m: number | null;
  phone: string | null;
  note: string | null;
  version: number;
  created_at: string;
}

declare module '../../db/database' {
  interface Database {
    areas: AreaTable;
  }
}
