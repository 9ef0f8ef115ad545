import { effect, inject, Injectable } from '@angular/core';

import { CurrentSession } from '../session/current-session';

const PREFIX = 'limen.draft.';

export interface LocalDraft {
  readonly savedAt: string;
  readonly value: unknown;
}

/**
 * What was typed and not yet saved, kept on this device for the person who typed it. Gone once it
 * is saved, and for everybody at sign-out.
 */
@Injectable({ providedIn: 'root' })
export class LocalDrafts {
  private readonly user = inject(CurrentSession).user;
  private hadUser = false;

  constructor() {
    // Signing out leaves nothing behind on the device.
    effect(() => {
      const hasUser = this.user() !== null;
      if (this.hadUser && !hasUser) this.forgetAll();
      this.hadUser = hasUser;
    });
  }

  read(name: string): LocalDraft | undefined {
    const text = attempt(() => localStorage.getItem(this.key(name)));
    return text ? attempt(() => JSON.parse(text) as LocalDraft) : undefined;
  }

  write(name: string, value: unknown): void {
    const draft: LocalDraft = { savedAt: new Date().toISOString(), value };
    attempt(() => localStorage.setItem(this.key(name), JSON.stringify(draft)));
  }

  forget(name: string): void {
    attempt(() => localStorage.removeItem(this.key(name)));
  }

  forgetAll(): void {
    attempt(() =>
      Object.keys(localStorage)
        .filter((key) => key.startsWith(PREFIX))
        .forEach((key) => localStorage.removeItem(key)),
    );
  }

  private key(name: string): string {
    return `${PREFIX}${this.user()?.id ?? ''}.${name}`;
  }
}

/** Storage can be full, switched off, or hold what is not ours: then there is no draft. */
function attempt<T>(act: () => T): T | undefined {
  try {
    return act();
  } catch {
    // QuotaExceededError, SecurityError or SyntaxError.
    return undefined;
  }
}
