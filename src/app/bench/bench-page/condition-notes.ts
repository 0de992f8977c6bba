import { inject, Injectable } from '@angular/core';
import { type Observable, tap } from 'rxjs';
import { type LotConditions, type NotedConditions, noteConditions } from '#shared/contract/conditions';
import { ApiClient } from '../../data/api';
import { BenchSheet } from '../sheet/bench-sheet';

const NOTHING_NOTED: LotConditions = {
  ambientCelsius: null,
  mainsVolts: null,
  mainsHertz: null,
  load: '',
  bandwidth: '',
  warmUpStartedAt: null,
  note: '',
};

/** Notes what the lot is measured under. What was noted before stays on record. */
@Injectable()
export class ConditionNotes {
  private readonly api = inject(ApiClient);
  private readonly sheet = inject(BenchSheet);

  /** What is noted now, as it would be noted again. */
  current(): LotConditions {
    return { ...NOTHING_NOTED, ...this.sheet.bench().conditions };
  }

  note(conditions: LotConditions): Observable<NotedConditions> {
    const params = { id: this.sheet.bench().lot.id };
    return this.api
      .call(noteConditions, { params, body: conditions })
      .pipe(tap((noted) => this.sheet.take({ conditions: noted })));
  }

  /** Notes that the warm-up begins now. */
  startWarmUp(): Observable<NotedConditions> {
    return this.note({ ...this.current(), warmUpStartedAt: new Date().toISOString() });
  }
}
