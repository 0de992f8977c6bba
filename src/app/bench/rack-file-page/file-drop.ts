import { ChangeDetectionStrategy, Component, input, output, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Icon } from '../../ui/marks/icon';

/** A file that was picked, as text. */
export interface PickedFile {
  readonly name: string;
  readonly text: string;
}

/** Larger files are not rack files; the server takes no more either. */
const MOST_BYTES = 20_000_000;

/** Takes a file by choosing or by dropping. */
@Component({
  selector: 'qr-file-drop',
  imports: [Icon, MatButton],
  template: `
    <div
      class="drop"
      [class.over]="over()"
      (dragover)="over.set(true); $event.preventDefault()"
      (dragleave)="over.set(false)"
      (drop)="drop($event)"
    >
      <qr-icon name="upload" [size]="24" />
      <span>{{ name() || 'Drop the CSV file here' }}</span>
      <button type="button" matButton="outlined" (click)="chooser.click()">
        {{ name() ? 'Choose another' : 'Choose a file' }}
      </button>
      <input
        #chooser
        class="unseen"
        type="file"
        tabindex="-1"
        accept=".csv,.txt,text/csv,text/plain"
        aria-label="Rack file"
        (change)="take(chooser.files); chooser.value = ''"
      />
    </div>
    @if (refusal()) {
      <p class="nok small" role="alert">{{ refusal() }}</p>
    }
  `,
  styles: `
    .drop {
      position: relative;
      display: flex;
      flex-direction: column;
      align-items: center;
      gap: 8px;
      padding: 20px;
      border: 1px dashed var(--qr-line-2);
      border-radius: var(--qr-r-control);
      color: var(--qr-ink-2);
      text-align: center;
      overflow-wrap: anywhere;
    }
    .over {
      border-color: var(--qr-primary);
      background: var(--qr-row-focus);
    }
    p {
      margin-top: 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FileDrop {
  /** Name of the file picked before. */
  readonly name = input('');
  readonly picked = output<PickedFile>();

  protected readonly over = signal(false);
  protected readonly refusal = signal('');

  protected drop(event: DragEvent): void {
    event.preventDefault();
    this.over.set(false);
    void this.take(event.dataTransfer?.files ?? null);
  }

  protected async take(files: FileList | null): Promise<void> {
    const file = files?.[0];
    if (file === undefined) return;
    this.refusal.set(refusalOf(file));
    if (this.refusal() === '') this.picked.emit({ name: file.name, text: await file.text() });
  }
}

function refusalOf({ name, size }: File): string {
  if (size === 0) return `${name} is empty.`;
  return size > MOST_BYTES ? `${name} is larger than 20 MB. Export the readings of one lot only.` : '';
}
