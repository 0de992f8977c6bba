import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { Router } from '@angular/router';
import { type Fault } from '#shared/contract/problem';
import { signIn } from '#shared/contract/session';
import { readFront, type Front } from '#shared/contract/site';
import { endpointResource } from '../../data/api';
import { problemOf } from '../../data/api-problem';
import { VerdictMark } from '../../ui/marks/verdict-mark';
import { MessageNote } from '../../ui/states/message-note';
import { FrontFooter } from '../front-footer/front-footer';
import { FrontRipple } from '../front-ripple';
import { Session } from '../session';
import { DemoSignIns } from './demo-sign-ins';

/**
 * Where a person says who they are; afterwards they come to the address they wanted. It is the first page that is loaded, so
 * it does without the forms and component libraries: two fields do not need them.
 */
@Component({
  selector: 'qr-sign-in-page',
  imports: [DemoSignIns, FrontFooter, FrontRipple, MessageNote, VerdictMark],
  templateUrl: './sign-in-page.html',
  styleUrl: '../front.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInPage {
  private readonly session = inject(Session);
  private readonly router = inject(Router);

  /** The address to go to afterwards. */
  readonly back = input<string>();

  protected readonly front = endpointResource(readFront, () => ({}));
  protected readonly signIns = computed(() => (this.front.hasValue() ? this.front.value().signIns : []));
  protected readonly email = signal('');
  protected readonly password = signal('');
  protected readonly keep = signal(false);
  protected readonly shown = signal(false);
  protected readonly busy = signal(false);
  protected readonly refusal = signal('');
  private readonly faults = signal<readonly Fault[]>([]);
  protected readonly emailFault = computed(() => this.faultOf('email'));
  protected readonly passwordFault = computed(() => this.faultOf('password'));

  protected fill({ email, password }: Front['signIns'][number]): void {
    this.email.set(email);
    this.password.set(password);
    this.faults.set([]);
    this.refusal.set('');
  }

  protected submit(event: Event): void {
    event.preventDefault();
    this.refusal.set('');
    const read = signIn.body.safeParse({ email: this.email(), password: this.password(), keep: this.keep() });
    this.faults.set(read.success ? [] : faultsOf(read.error.issues));
    if (!read.success || this.busy()) return;
    this.busy.set(true);
    this.session.signIn(read.data).subscribe({
      next: () => void this.router.navigateByUrl(this.back() ?? '/', { replaceUrl: true }),
      error: (thrown: unknown) => this.refuse(thrown),
    });
  }

  private refuse(thrown: unknown): void {
    const problem = problemOf(thrown);
    this.busy.set(false);
    this.faults.set(problem.faults);
    if (problem.faults.length === 0) this.refusal.set(problem.message);
  }

  private faultOf(field: string): string {
    return this.faults().find(({ path }) => path[0] === field)?.message ?? '';
  }
}

function faultsOf(issues: readonly { path: PropertyKey[]; message: string }[]): Fault[] {
  return issues.map(({ path, message }) => ({ path: path.map(String), message }));
}
