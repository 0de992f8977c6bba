import { inject } from '@angular/core';
import { type Observable, switchMap } from 'rxjs';
import {
  changeInstrument,
  type Instrument,
  type InstrumentRange,
  type RangeBody,
  readInstrument,
} from '#shared/contract/instruments';
import { ApiClient } from '../../data/api';

/** Adds and retires ranges of an instrument as it stands at that moment: neither undoes what others changed of it. */
export class ChangeRanges {
  private readonly api = inject(ApiClient);

  add(instrumentId: number, range: RangeBody): Observable<Instrument> {
    return this.change(instrumentId, (ranges) => [...ranges, range]);
  }

  retire(instrumentId: number, rangeId: number): Observable<Instrument> {
    return this.change(instrumentId, (ranges) => ranges.filter(({ id }) => id !== rangeId));
  }

  private change(id: number, of: (ranges: readonly InstrumentRange[]) => RangeBody[]): Observable<Instrument> {
    const params = { id };
    return this.api.call(readInstrument, { params }).pipe(
      switchMap(({ version, ranges, ...instrument }) => {
        const { assetNumber, kind, description, serialNumber, place, status, dailyReference } = instrument;
        const body = {
          assetNumber,
          kind,
          description,
          serialNumber,
          place,
          status,
          dailyReference,
          ranges: of(ranges),
        };
        return this.api.call(changeInstrument, { params, body, version });
      }),
    );
  }
}
