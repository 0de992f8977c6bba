import { ChangeDetectionStrategy, Component, input, output, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Icon } from './marks/icon';

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
      <span>{{ name() || prompt() }}</span>
      <button type="button" matButton="outlined" (click)="chooser.click()">
        {{ name() ? 'Choose another' : 'Choose a file' }}
      </button>
      <input
        #chooser
        class="unseen"
        type="file"
        tabindex="-1"
        [accept]="accept()"
        [attr.aria-label]="label()"
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
  /** What the choosing is called for who does not see it: "Rack file". */
  readonly label = input.required<string>();
  readonly prompt = input('Drop the CSV file here');
  /** Endings and media types that the chooser offers. */
  readonly accept = input('.csv,.txt,text/csv,text/plain');
  /** Bytes at most. */
  readonly most = input.required<number>();
  /** What to do about a file that is too large. */
  readonly tooLarge = input('');
  readonly picked = output<File>();

  protected readonly over = signal(false);
  protected readonly refusal = signal('');

  protected drop(event: DragEvent): void {
    event.preventDefault();
    this.over.set(false);
    this.take(event.dataTransfer?.files ?? null);
  }

  protected take(files: FileList | null): void {
    const file = files?.[0];
    if (file === undefined) return;
    this.refusal.set(this.refusalOf(file));
    if (this.refusal() === '') this.picked.emit(file);
  }

  private refusalOf({ name, size }: File): string {
    if (size === 0) return `${name} is empty.`;
    if (size <= this.most()) return '';
    return `${name} is larger than ${Math.floor(this.most() / 1_000_000)} MB. ${this.tooLarge()}`.trim();
  }
}
