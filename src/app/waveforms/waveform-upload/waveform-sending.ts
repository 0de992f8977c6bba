import { DestroyRef, inject, Injectable, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { type Subscription } from 'rxjs';
import { keepWaveform, type Waveform } from '#shared/contract/waveforms';
import { problemOf } from '../../data/api-problem';
import { ApiClient } from '../../data/api';

/** What a file is a waveform of. */
export interface WaveformPlace {
  readonly lotId: number;
  readonly unit: number;
  readonly characteristicKey: string | null;
}

/** How far a file is: nothing chosen, on its way, being read by the server, or refused with the reason. */
export type Sending =
  | { readonly state: 'idle' }
  | { readonly state: 'sending'; readonly name: string; readonly share: number }
  | { readonly state: 'reading'; readonly name: string }
  | { readonly state: 'refused'; readonly name: string; readonly reason: string };

const IDLE: Sending = { state: 'idle' };

/** Sends a waveform file. Its id is made here: sent again after a break it is not kept twice. */
@Injectable()
export class WaveformSending {
  private readonly api = inject(ApiClient);
  private readonly destroyed = inject(DestroyRef);
  private readonly now = signal<Sending>(IDLE);
  private running: Subscription | undefined;
  private last: { file: File; id: string; place: WaveformPlace } | undefined;

  readonly progress = this.now.asReadonly();

  /** @param channel name of the column to take; the first after the time where null */
  send(file: File, place: WaveformPlace, kept: (waveform: Waveform) => void, channel: string | null = null): void {
    this.last = { file, id: crypto.randomUUID(), place };
    this.go(kept, channel);
  }

  /** Sends the refused or broken file once more, under the id it had. */
  again(kept: (waveform: Waveform) => void): void {
    this.go(kept, null);
  }

  cancel(): void {
    this.running?.unsubscribe();
    this.now.set(IDLE);
  }

  private go(kept: (waveform: Waveform) => void, channel: string | null): void {
    if (!this.last) return;
    const { file, id, place } = this.last;
    const { name } = file;
    this.running?.unsubscribe();
    this.now.set({ state: 'sending', name, share: 0 });
    const { lotId, unit, characteristicKey } = place;
    this.running = this.api
      .upload(keepWaveform, {
        params: { id: lotId, waveform: id },
        query: {
          fileName: name,
          unit,
          ...(characteristicKey === null ? {} : { characteristicKey }),
          ...(channel === null ? {} : { channel }),
        },
        file,
      })
      .pipe(takeUntilDestroyed(this.destroyed))
      .subscribe({
        next: (step) => {
          if (step.state === 'done') {
            this.now.set(IDLE);
            kept(step.reply);
          } else if (step.share >= 1) this.now.set({ state: 'reading', name });
          else this.now.set({ state: 'sending', name, share: step.share });
        },
        error: (thrown: unknown) => this.now.set({ state: 'refused', name, reason: reasonOf(thrown) }),
      });
  }
}

/** The server names what is wrong with the file beside the file; all else it says in its title. */
function reasonOf(thrown: unknown): string {
  const problem = problemOf(thrown);
  return problem.faults.map(({ message }) => message).join(' ') || problem.message;
}
