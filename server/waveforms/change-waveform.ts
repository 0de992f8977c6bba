import { type Db } from '#db/open-database';
import { readings } from '#db/schema/readings';
import { waveforms } from '#db/schema/waveforms';
import { record } from '#server/audit/record';
import { lotAtBench } from '#server/bench/bench-lot';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { Conflict, holdVersion, Refused } from '#server/problems';
import { type Waveform } from '#shared/contract/waveforms';
import { and, eq, isNull } from 'drizzle-orm';
import { measuredPart } from './measured-part';
import { findWaveform, findWaveformRow, type WaveformRow } from './waveform-view';

interface Named {
  id: string;
  version: number;
}

/** A waveform as it may be changed: of a lot at the bench, not withdrawn, and no reading stands on it. */
function changeable(db: Db, { id, version }: Named): WaveformRow {
  const row = findWaveformRow(db, id);
  holdVersion('The waveform', row.version, version);
  if (row.withdrawnAt !== null) throw new Conflict('waveform-withdrawn', 'This waveform was withdrawn.');
  lotAtBench(db, row.lotId);
  const standing = db
    .select({ id: readings.id })
    .from(readings)
    .where(and(eq(readings.waveformId, id), isNull(readings.withdrawnAt)))
    .get();
  if (standing)
    throw new Conflict(
      'waveform-in-use',
      'A reading was taken from this waveform. Withdraw or repeat the reading first.',
    );
  return row;
}

/**
 * Puts a waveform's peaks where a person sees them, and computes what follows from them.
 *
 * @throws {Refused} for a peak outside the whole line cycles that values are computed of, or two at one place
 */
export async function movePeaks(
  { db, clock, waves, files }: Context,
  caller: Caller,
  named: Named,
  indices: number[],
): Promise<Waveform> {
  const before = changeable(db, named);
  const { samples, spacing, interpolated, analysis } = before.record;
  const wrong = (message: string) => new Refused('peaks-refused', message, [{ path: ['indices'], message }]);
  if (indices.some((index) => index >= samples)) throw wrong(`The waveform has ${samples} samples.`);
  if (new Set(indices).size < indices.length) throw wrong('Two peaks stand at the same place.');
  if (analysis.lineCycles === 0) throw wrong('The record holds no whole line cycle; its peaks say nothing.');
  const { filePath } = files.find(db, before.samplesId);
  const lot = lotAtBench(db, before.lotId);
  const part = measuredPart(db, lot);
  const { computed } = await waves.withPeaks({ kind: 'peaks', path: filePath, spacing, interpolated, indices, part });
  const at = clock.now();
  db.transaction((tx) => {
    const row = changeable(tx, named);
    const moved = { by: caller.name, at: at.toISOString() };
    tx.update(waveforms)
      .set({ record: { ...row.record, ...computed, moved }, version: row.version + 1 })
      .where(eq(waveforms.id, row.id))
      .run();
    record(tx, {
      at,
      person: caller,
      action: 'peaks moved',
      subject: 'waveform',
      subjectId: row.id,
      before: {
        peaks: row.record.analysis.peaks.map(({ index }) => index),
        found: row.record.findings.map(({ kind }) => kind),
      },
      after: {
        peaks: computed.analysis.peaks.map(({ index }) => index),
        found: computed.findings.map(({ kind }) => kind),
      },
    });
  });
  return findWaveform(db, named.id);
}

/** Takes a waveform back that no reading stands on; it stays on record. */
export function withdrawWaveform({ db, clock, stream }: Context, caller: Caller, named: Named, reason: string) {
  const at = clock.now();
  const lotId = db.transaction((tx) => {
    const row = changeable(tx, named);
    const withdrawn = { withdrawnAt: at.toISOString(), withdrawnById: caller.id, withdrawReason: reason };
    tx.update(waveforms)
      .set({ ...withdrawn, version: row.version + 1 })
      .where(eq(waveforms.id, row.id))
      .run();
    const change = { action: 'withdrawn', subject: 'waveform', subjectId: row.id, after: { reason } };
    record(tx, { at, person: caller, ...change });
    return row.lotId;
  });
  stream.announceLot(lotId);
  return { done: true } as const;
}
