import { DOCUMENT, inject, Injectable, signal } from '@angular/core';

export const THEMES = ['system', 'light', 'dark'] as const;
export type ThemeName = (typeof THEMES)[number];

const STORAGE_KEY = 'limen.theme';

/** Light, dark, or as the system says; remembered in this browser. */
@Injectable({ providedIn: 'root' })
export class Theme {
  private readonly document = inject(DOCUMENT);
  private readonly chosen = signal<ThemeName>(this.remembered());

  readonly name = this.chosen.asReadonly();

  choose(name: ThemeName): void {
    this.chosen.set(name);
    const root = this.document.documentElement;
    if (name === 'system') delete root.dataset['theme'];
    else root.dataset['theme'] = name;
    try {
      localStorage.setItem(STORAGE_KEY, name);
    } catch {
      // SecurityError: storage is switched off; the choice then lasts for this page.
    }
  }

  private remembered(): ThemeName {
    const theme = this.document.documentElement.dataset['theme'];
    return theme === 'light' || theme === 'dark' ? theme : 'system';
  }
}
