export interface CredentialTable {
  person_id: string;
  /** PHC string, argon2id. */
  password_hash: string;
  changed_at: string;
}

export interface InvitationTable {
  token_hash: string;
  person_id: string;
  expires_at: string;
  used_at: string | null;
}

export interface SetupTokenTable {
  token_hash: string;
  created_at: string;
  used_at: string | null;
}

export interface SessionTable {
  /** SHA-256 of the session id: a copy of the database holds no usable session. */
  sid_hash: string;
  person_id: string | null;
  data: string;
  created_at: string;
  seen_at: string;
}

/** Counted attempts in a window, kept over a restart. */
export interface AttemptTable {
  key: string;
  window_started_at: string;
  count: number;
}

declare module '../db/database' {
  interface Database {
    credentials: CredentialTable;
    invitations: InvitationTable;
    setup_tokens: SetupTokenTable;
    sessions: SessionTable;
    attempts: AttemptTable;
  }
}
