import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import { ROLE_WORDS } from '@shared/model/people';

import { Icon } from '../../ui/icon/icon';
import type { IconName } from '../../ui/icon/icon-paths';
import { CurrentSession } from '../session/current-session';
import { Theme, type ThemeName, THEMES } from '../theme/theme';

const THEME_ICONS: Readonly<Record<ThemeName, IconName>> = {
  system: 'theme-system',
  light: 'theme-light',
  dark: 'theme-dark',
};

/** Who is signed in, in which role, at which site; theme and sign-out beside it. */
@Component({
  selector: 'lm-user-block',
  imports: [Icon, RouterLink],
  templateUrl: './user-block.html',
  styleUrl: './user-block.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UserBlock {
  private readonly session = inject(CurrentSession);
  private readonly router = inject(Router);
  private readonly theme = inject(Theme);

  protected readonly user = this.session.user;
  protected readonly site = this.session.site;
  protected readonly roles = computed(() =>
    (this.user()?.roles ?? []).map((role) => ROLE_WORDS[role]).join(', '),
  );
  protected readonly themeIcon = computed(() => THEME_ICONS[this.theme.name()]);
  protected readonly themeLabel = computed(
    () => `Theme: ${this.theme.name()}. Change to ${nextTheme(this.theme.name())}`,
  );

  protected changeTheme(): void {
    this.theme.choose(nextTheme(this.theme.name()));
  }

  protected signOut(): void {
    this.session.signOut().subscribe(() => this.router.navigateByUrl('/sign-in'));
  }
}

function nextTheme(theme: ThemeName): ThemeName {
  return THEMES[(THEMES.indexOf(theme) + 1) % THEMES.length] ?? 'system';
}
