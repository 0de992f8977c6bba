import { DestroyRef, inject, Injectable, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { Router } from '@angular/router';
import { filter, finalize, switchMap, tap } from 'rxjs';
import { submitLot } from '#shared/contract/bench';
import { ApiClient } from '../../data/api';
import { problemOf } from '../../data/api-problem';
import { BenchHand } from '../bench-hand';
import { BenchCursor } from '../sheet/bench-cursor';
import { BenchSheet } from '../sheet/bench-sheet';
import { ReadingDraft } from '../sheet/reading-draft';
import { ReadingQueue } from '../waiting/reading-queue';
import { DeskCommands } from './desk-commands';
import { BenchQuestions } from './dialogs/bench-questions';

/** Hands the measured lot over to quality. */
@Injectable()
export class LotSubmission {
  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);
  private readonly destroyed = inject(DestroyRef);
  private readonly queue = inject(ReadingQueue);
  private readonly sheet = inject(BenchSheet);
  private readonly cursor = inject(BenchCursor);
  private readonly draft = inject(ReadingDraft);
  private readonly hand = inject(BenchHand);
  private readonly questions = inject(BenchQuestions);
  private readonly commands = inject(DeskCommands);

  readonly busy = signal(false);
  /** Why the lot was not submitted. */
  readonly said = signal('');

  submit(): void {
    this.said.set('');
    if (this.draft.mayLeave() && this.nothingMissing() && this.nothingWaiting()) this.ask();
  }

  /** Readings may be missing only once the lot is stopped; otherwise goes to the first that is. */
  private nothingMissing(): boolean {
    const missing = this.sheet.missing();
    if (missing === 0 || this.sheet.lot().stop) return true;
    this.cursor.goToMissing();
    this.commands.toGrid.next();
    this.hand.hold(`${missing === 1 ? '1 reading is' : `${missing} readings are`} missing. This is the first.`);
    return false;
  }

  private nothingWaiting(): boolean {
    const { id } = this.sheet.bench().lot;
    const open = this.queue.entries().filter(({ act }) => act.lotId === id).length;
    if (open > 0) this.said.set(`${open} entries have not reached the server yet. Submit when everything is saved.`);
    return open === 0;
  }

  private ask(): void {
    const { lot, version } = this.sheet.bench();
    this.questions
      .submit()
      .pipe(
        filter((confirmed) => confirmed),
        tap(() => this.busy.set(true)),
        switchMap(() => this.api.call(submitLot, { params: { id: lot.id }, version })),
        finalize(() => this.busy.set(false)),
        takeUntilDestroyed(this.destroyed),
      )
      .subscribe({
        next: () => void this.router.navigate(['/lots', lot.id]),
        error: (thrown: unknown) => this.said.set(problemOf(thrown).message),
      });
  }
}
