import { ChangeDetectionStrategy, Component, type OnInit, inject } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import { confirmSignUp } from '@oriel/shared/contracts/accounts';
import { Api } from '../../core/api';
import { FailureNotice } from '../../core/failure-notice';
import { Session } from '../../core/session';
import { Submission } from '../../core/submission';
import { mailedToken } from '../mailed-token';
import { Threshold } from '../threshold/threshold';

@Component({
  selector: 'oriel-confirm',
  imports: [RouterLink, FailureNotice, Threshold],
  template: `
    <oriel-threshold>
      @if (submission.failure(); as failure) {
        <h1>This link did not work</h1>
        <oriel-failure-notice [failure]="failure" [retryable]="failure.offline" (retry)="confirm()" />
        <p class="links"><a routerLink="/sign-in">Sign in</a> <a routerLink="/sign-up">Make a household</a></p>
      } @else {
        <h1>Opening your household…</h1>
      }
    </oriel-threshold>
  `,
  styleUrl: '../account-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Confirm implements OnInit {
  private readonly api = inject(Api);
  private readonly session = inject(Session);
  private readonly router = inject(Router);
  private readonly token = mailedToken();
  protected readonly submission = new Submission();

  ngOnInit(): void {
    void this.confirm();
  }

  protected confirm(): Promise<void> {
    return this.submission.run(async () => {
      const { account } = await this.api.call(confirmSignUp, { body: { token: this.token } });
      this.session.enter(account);
      await this.router.navigateByUrl('/photos');
    });
  }
}
