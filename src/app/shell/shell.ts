import { NgTemplateOutlet } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { Router, RouterLink, RouterLinkActive, RouterOutlet } from '@angular/router';
import { Icon } from '../core/icon/icon';
import { Light, type LightChoice } from '../core/light';
import { Session } from '../core/session';
import { PageBar } from './page-bar';

/** The frame around every page for members: name, places, and the account's menu. */
@Component({
  selector: 'oriel-shell',
  imports: [NgTemplateOutlet, RouterOutlet, RouterLink, RouterLinkActive, MatButton, MatMenu, MatMenuItem, MatMenuTrigger, Icon],
  templateUrl: './shell.html',
  styleUrl: './shell.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Shell {
  protected readonly session = inject(Session);
  protected readonly light = inject(Light);
  protected readonly bar = inject(PageBar);
  private readonly router = inject(Router);
  protected readonly lights: readonly { choice: LightChoice; word: string; icon: 'system' | 'day' | 'evening' }[] = [
    { choice: 'system', word: 'As the system', icon: 'system' },
    { choice: 'day', word: 'Day', icon: 'day' },
    { choice: 'evening', word: 'Evening', icon: 'evening' },
  ];

  protected async chooseHousehold(householdId: string): Promise<void> {
    this.session.choose(householdId);
    await this.router.navigateByUrl('/', { skipLocationChange: true });
    await this.router.navigateByUrl('/scenes');
  }

  protected async signOut(): Promise<void> {
    await this.session.leave();
    await this.router.navigateByUrl('/sign-in');
  }
}
