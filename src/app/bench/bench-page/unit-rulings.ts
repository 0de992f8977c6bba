import { inject, Injectable } from '@angular/core';
import { type Observable, tap } from 'rxjs';
import { ruleOnUnit } from '#shared/contract/bench';
import { ApiClient } from '../../data/api';
import { may } from '../../session/may';
import { BenchCursor } from '../sheet/bench-cursor';
import { BenchSheet } from '../sheet/bench-sheet';
import { type UnitRecord } from '../sheet/unit-record';
import { type Ruling, type RulingQuestion } from './dialogs/ruling-dialog';

/** Quality's rulings on undecided units. */
@Injectable()
export class UnitRulings {
  private readonly api = inject(ApiClient);
  private readonly sheet = inject(BenchSheet);
  private readonly cursor = inject(BenchCursor);
  private readonly mayRule = may(ruleOnUnit);

  /** Whether the person may rule on the unit in focus now, or take a ruling back. */
  offered(): boolean {
    const record = this.cursor.record();
    return this.mayRule() && (record.ruling !== null || this.sheet.verdictOf(record).verdict === 'undecided');
  }

  /** What is asked about the unit in focus. */
  question(): RulingQuestion {
    const record = this.cursor.record();
    return {
      unit: record.unit,
      doubt: this.doubtOf(record),
      standing: record.ruling?.ruling ?? null,
      rule: (ruling, reason) => this.rule(record.unit, ruling, reason),
    };
  }

  private rule(unit: number, ruling: Ruling | null, reason: string): Observable<unknown> {
    const params = { id: this.sheet.bench().lot.id, unit };
    return this.api.call(ruleOnUnit, { params, body: { ruling, reason } }).pipe(
      tap(() => {
        const ruled = ruling && { ruling, reason, by: this.sheet.takenBy(), at: new Date().toISOString() };
        this.sheet.replace(new Set([unit]), (record) => ({ ...record, ruling: ruled }));
      }),
    );
  }

  private doubtOf(record: UnitRecord): string {
    if (record.ruling !== null)
      return `It was ruled ${record.ruling.ruling} by ${record.ruling.by}: ${record.ruling.reason}.`;
    if (record.setAside !== null) return `It was set aside: ${record.setAside}.`;
    const { characteristics } = this.sheet.verdictOf(record);
    const names = this.sheet
      .bench()
      .characteristics.filter(({ key }) => characteristics.get(key)?.verdict === 'conditional')
      .map(({ name }) => name.toLowerCase());
    return `Its ${names.join(' and ')} ${names.length === 1 ? 'is' : 'are'} conditional: too near the limit to be sure.`;
  }
}
