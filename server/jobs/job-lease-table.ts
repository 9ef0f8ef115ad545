export interface JobLeaseTable {
  name: string;
  owner: string;
  leased_until: string;
  /** End of the last period that was worked off. */
  done_until: string;
}

declare module '../db/database' {
  interface Database {
    job_leases: JobLeaseTable;
  }
}
