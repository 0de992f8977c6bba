import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  numberAttribute,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { importRackFile, previewRackFile, type RackPreview, readBench } from '#shared/contract/bench';
import { ApiClient, endpointResource } from '../../data/api';
import { RecordSave } from '../../data/record-save';
import { BackLink } from '../../shell/back-link';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { MessageNote } from '../../ui/states/message-note';
import { ExpectedColumns } from './expected-columns';
import { FileDrop, type PickedFile } from './file-drop';
import { RackFaults } from './rack-faults';
import { RackInstruments } from './rack-instruments';
import { RackResult } from './rack-result';

/** Brings the readings of an automated rack in from its CSV file: seen first, then all rows or none. */
@Component({
  selector: 'qr-rack-file-page',
  imports: [
    BackLink,
    ExpectedColumns,
    FileDrop,
    Loaded,
    MatButton,
    MessageNote,
    PageState,
    RackFaults,
    RackInstruments,
    RackResult,
    RouterLink,
  ],
  templateUrl: './rack-file-page.html',
  styleUrl: './rack-file-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RackFilePage {
  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);

  readonly id = input.required({ transform: numberAttribute });

  protected readonly bench = endpointResource(readBench, () => ({ params: { id: this.id() } }));
  protected readonly file = signal<PickedFile | null>(null);
  /** Ids of the instruments the rack measured with. */
  protected readonly instruments = signal<readonly number[]>([]);
  /** What the file would bring; another file or another instrument makes it void. */
  protected readonly preview = linkedSignal<unknown, RackPreview | null>({
    source: () => [this.file(), this.instruments()],
    computation: () => null,
  });
  protected readonly reading = new RecordSave();
  protected readonly importing = new RecordSave();
  protected readonly sound = computed(() => this.preview()?.faults.length === 0);

  protected pick(file: PickedFile): void {
    this.file.set(file);
    this.look();
  }

  protected name(ids: readonly number[]): void {
    this.instruments.set(ids);
    this.look();
  }

  protected look(): void {
    const [body, file, instruments] = [this.body(), this.file(), this.instruments()];
    if (body === null) return;
    this.reading.run(this.api.call(previewRackFile, { params: { id: this.id() }, body }), (preview) => {
      if (file === this.file() && instruments === this.instruments()) this.preview.set(preview);
    });
  }

  protected bringIn(): void {
    const body = this.body();
    if (body === null || !this.sound()) return;
    this.importing.run(
      this.api.call(importRackFile, { params: { id: this.id() }, body }),
      () => void this.router.navigate(['/bench', this.id()]),
    );
  }

  private body() {
    const file = this.file();
    return file && { fileName: file.name, text: file.text, instrumentIds: [...this.instruments()] };
  }
}
