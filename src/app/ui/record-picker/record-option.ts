import type { Observable } from 'rxjs';

/** A record that can be picked: its name, and what tells it from its namesakes. */
export interface RecordOption {
  readonly id: string;
  readonly name: string;
  readonly note?: string | undefined;
}

/** Records whose name meets what was typed; all, up to a screenful, for an empty text. */
export type FindRecords = (text: string) => Observable<readonly RecordOption[]>;
