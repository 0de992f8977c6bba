import { Directive, inject, input, TemplateRef } from '@angular/core';
import { type ResourceLike } from './resource-like';

interface LoadedContext<T> {
  $implicit: NonNullable<T>;
}

/** Marks the template of a `qr-page-state` that is shown once its resource has a value, and hands it that value. */
@Directive({ selector: 'ng-template[qrLoaded]' })
export class Loaded<T> {
  readonly qrLoaded = input.required<ResourceLike<T>>();
  readonly template = inject<TemplateRef<LoadedContext<T>>>(TemplateRef);

  static ngTemplateContextGuard<T>(directive: Loaded<T>, context: unknown): context is LoadedContext<T> {
    return directive instanceof Loaded && typeof context === 'object';
  }
}
