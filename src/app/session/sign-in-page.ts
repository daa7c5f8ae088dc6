import { ChangeDetectionStrategy, Component, inject, input, viewChild } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import { FaultNote } from '../ui/fault-note';
import { Entrance } from './entrance';
import { SessionStore } from './session-store';
import { SignInForm } from './sign-in-form';

@Component({
  selector: 'slant-sign-in-page',
  imports: [Entrance, FaultNote, RouterLink, SignInForm],
  templateUrl: './sign-in-page.html',
  styleUrl: './form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInPage {
  private readonly store = inject(SessionStore);
  private readonly router = inject(Router);
  private readonly form = viewChild.required(SignInForm);
  /** Where the person wanted to go, from the query. */
  readonly to = input<string>();
  protected readonly about = this.store.about;

  protected continueWork(): void {
    const wanted = this.to();
    // Only addresses of this client: a foreign one would make the sign-in page a trap.
    void this.router.navigateByUrl(wanted !== undefined && /^\/(?![/\\])/.test(wanted) ? wanted : '/projects');
  }

  protected fillIn(email: string): void {
    this.form().fill(email);
  }
}
