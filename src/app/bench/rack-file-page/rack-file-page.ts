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
import { type Bench, importRackFile, previewRackFile, type RackPreview, readBench } from '#shared/contract/bench';
import { ApiClient, endpointResource } from '../../data/api';
import { RecordSave } from '../../data/record-save';
import { BackLink } from '../../shell/back-link';
import { FileDrop } from '../../ui/file-drop';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { MessageNote } from '../../ui/states/message-note';
import { columnMeanings, type Meaning } from './column-meaning';
import { ExpectedColumns } from './expected-columns';
import { RackChoice } from './rack-choice';
import { RackColumns, type SaidOfColumn } from './rack-columns';
import { RackFaults } from './rack-faults';
import { RackInstruments } from './rack-instruments';
import { RackQuestions } from './rack-questions';
import { RackResult } from './rack-result';

/** Larger files are not rack files; the server takes no more either. */
const MOST_BYTES = 20_000_000;

/** A file that was picked, as text. */
interface PickedFile {
  readonly name: string;
  readonly text: string;
}

/** Brings the readings of an automated rack in from its CSV file: its columns named, then seen, then all rows or none. */
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
    RackChoice,
    RackColumns,
    RackFaults,
    RackInstruments,
    RackQuestions,
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
  protected readonly mostBytes = MOST_BYTES;
  protected readonly file = signal<PickedFile | null>(null);
  /** Ids of the instruments the rack measured with. */
  protected readonly instruments = signal<readonly number[]>([]);
  /** The rack whose file it is; null for none of those set up. */
  protected readonly rackId = signal<number | null>(null);
  /** The columns of the file, once the server has seen it. */
  protected readonly columns = linkedSignal<unknown, RackPreview['columns']>({
    source: this.file,
    computation: () => [],
  });
  /** What the person said of columns of this file. */
  private readonly said = linkedSignal<unknown, ReadonlyMap<string, Meaning>>({
    source: this.file,
    computation: () => new Map(),
  });
  protected readonly meanings = computed(() => {
    const headers = this.columns().map(({ header }) => header);
    return columnMeanings(headers, this.said(), this.known());
  });
  /** What the file would bring; another file, rack or instrument, or another word on a column, makes it void. */
  protected readonly preview = linkedSignal<unknown, RackPreview | null>({
    source: () => [this.file(), this.instruments(), this.rackId(), this.said()],
    computation: () => null,
  });
  /** What the server was asked last; an answer to anything else comes too late. */
  private asked: object | null = null;
  /** What is wrong beside columns that are not known yet; those say so themselves. */
  protected readonly faults = computed(() => {
    const headers = new Set(this.columns().map(({ header }) => header));
    const unknown = (column: string | null) => column !== null && headers.has(column) && !this.meanings().has(column);
    return (this.preview()?.faults ?? []).filter(({ column }) => !unknown(column));
  });
  protected readonly reading = new RecordSave();
  protected readonly importing = new RecordSave();
  protected readonly sound = computed(() => this.preview()?.faults.length === 0);

  protected async pick(file: File): Promise<void> {
    this.file.set({ name: file.name, text: await file.text() });
    this.look();
  }

  protected name(ids: readonly number[]): void {
    this.instruments.set(ids);
    this.look();
  }

  protected choose(rackId: number | null): void {
    this.rackId.set(rackId);
    this.look();
  }

  protected say({ header, meaning }: SaidOfColumn): void {
    this.said.update((said) => new Map(said).set(header, meaning));
    this.look();
  }

  /** Asks what the file would bring. Its columns become known by it: where they mean something, it is asked again. */
  private look(): void {
    const body = this.body();
    this.asked = body;
    if (body === null) return;
    this.reading.run(this.api.call(previewRackFile, { params: { id: this.id() }, body }), (preview) => {
      if (this.asked !== body) return;
      this.columns.set(preview.columns);
      if (isDifferent(body.mapping, this.mapping())) this.look();
      else this.preview.set(preview);
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
    if (file === null) return null;
    const { name: fileName, text } = file;
    const instrumentIds = [...this.instruments()];
    return { fileName, text, instrumentIds, rackId: this.rackId(), mapping: this.mapping() };
  }

  private mapping(): Record<string, Meaning> {
    return Object.fromEntries(this.meanings());
  }

  private known(): Parameters<typeof columnMeanings>[2] {
    const bench: Bench | undefined = this.bench.hasValue() ? this.bench.value() : undefined;
    const rack = bench?.racks.find(({ id }) => id === this.rackId());
    return { characteristics: bench?.characteristics ?? [], remembered: rack?.mapping ?? {} };
  }
}

function isDifferent(sent: Record<string, Meaning>, now: Record<string, Meaning>): boolean {
  const headers = Object.keys(now);
  return headers.length !== Object.keys(sent).length || headers.some((header) => sent[header] !== now[header]);
}
