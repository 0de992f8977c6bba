import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { DomSanitizer } from '@angular/platform-browser';
import { Segmented } from '../ui/segmented';

/**
 * The two bodies of a message. The HTML one is shown as a mail program would, in a frame that may run nothing, open nothing
 * and reach nothing of this page; only therefore is it let through as it is.
 */
@Component({
  selector: 'qr-mail-body',
  imports: [Segmented],
  template: `
    <qr-segmented label="Body" [options]="forms" [(value)]="form" />
    @if (form() === 'html') {
      <iframe title="The message as a mail program shows it" sandbox="" [srcdoc]="trusted()"></iframe>
    } @else {
      <pre tabindex="0">{{ text() }}</pre>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 12px;
      justify-items: start;
    }
    iframe {
      width: 100%;
      height: 860px;
      border: 1px solid var(--qr-line);
      border-radius: var(--qr-r-control);
      background: Canvas;
      color-scheme: light;
    }
    pre {
      width: 100%;
      margin: 0;
      padding: 14px 16px;
      overflow-x: auto;
      border: 1px solid var(--qr-line);
      border-radius: var(--qr-r-control);
      font: 400 13px/19px var(--qr-mono);
      white-space: pre-wrap;
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MailBody {
  private readonly sanitizer = inject(DomSanitizer);

  readonly html = input.required<string>();
  readonly text = input.required<string>();

  protected readonly forms = [
    { value: 'html', label: 'As a mail program shows it' },
    { value: 'text', label: 'Plain text' },
  ] as const;
  protected readonly form = signal<'html' | 'text'>('html');
  protected readonly trusted = computed(() => this.sanitizer.bypassSecurityTrustHtml(this.html()));
}
