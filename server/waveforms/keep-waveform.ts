import { type Db } from '#db/open-database';
import { waveforms } from '#db/schema/waveforms';
import { record } from '#server/audit/record';
import { lotAtBench } from '#server/bench/bench-lot';
import { type Context } from '#server/context';
import { type ReceivedFile } from '#server/files/file-store';
import { rulesOf, unitOf } from '#server/judging/lot-judging';
import { type LotRow } from '#server/lots/lot-rows';
import { Conflict, Refused } from '#server/problems';
import { type Waveform, type WaveformRecord } from '#shared/contract/waveforms';
import { WaveformNotUnderstood } from '#shared/waveform/waveform-not-understood';
import { eq } from 'drizzle-orm';
import { type Readable } from 'node:stream';
import { measuredPart } from './measured-part';
import { type WaveRead } from './wave-task';
import { findWaveform } from './waveform-view';

/** A waveform file on its way in. */
export interface SentWaveform {
  id: string;
  fileName: string;
  unit: number;
  characteristicKey?: string | undefined;
  /** Name of the column to take; the first after the time where undefined. */
  channel?: string | undefined;
  stream: Readable;
  /** Bytes at most. */
  most: number;
}

/** Who sends it: a person, or a rack. */
export interface WaveformSender {
  person: { id: number; name: string } | null;
  actor?: string;
  rackId: number | null;
}

function refuse(field: string, message: string): never {
  throw new Refused('waveform-refused', message, [{ path: [field], message }]);
}

/** The unit and the characteristic it is a waveform of. */
function placeOf(db: Db, lot: LotRow, { unit, characteristicKey }: SentWaveform) {
  const rows = unitOf(db, lot.id, unit);
  if (!rows) return refuse('unit', `Unit ${unit} is not in the sample of ${lot.sampleSize ?? 0}.`);
  if (characteristicKey === undefined) return { unitId: rows.unit.id, characteristicId: null };
  const found = rulesOf(db, lot).characteristics.find(({ content }) => content.key === characteristicKey);
  if (!found) return refuse('characteristicKey', `The plan has no characteristic ${characteristicKey}.`);
  return { unitId: rows.unit.id, characteristicId: found.id };
}

/** The same file sent twice is acknowledged twice; another one under its id is refused. */
function holdKnown(db: Db, lotId: number, { id, unit }: SentWaveform, received: ReceivedFile): Waveform {
  const known = findWaveform(db, id);
  if (known.lotId === lotId && known.unit === unit && known.sha256 === received.sha256) return known;
  throw new Conflict('waveform-id-used', 'Another waveform has this id already.');
}

async function readWave({ waves }: Context, file: ReceivedFile, lot: LotRow, db: Db, channel: string | undefined) {
  try {
    return await waves.read({ kind: 'file', path: file.path, channel: channel ?? null, part: measuredPart(db, lot) });
  } catch (error) {
    if (error instanceof WaveformNotUnderstood) refuse('file', error.message);
    throw error;
  }
}

function insert(
  context: Context,
  db: Db,
  lotId: number,
  sender: WaveformSender,
  sent: SentWaveform,
  kept: { file: ReceivedFile; samples: ReceivedFile; read: WaveRead },
): void {
  const at = context.clock.now();
  const lot = lotAtBench(db, lotId);
  const place = placeOf(db, lot, sent);
  const whole: WaveformRecord = { ...kept.read.record, moved: null };
  const { files } = context;
  db.insert(waveforms)
    .values({
      id: sent.id,
      lotId,
      ...place,
      fileId: files.name(db, kept.file, { fileName: sent.fileName, mediaType: 'text/csv', at }),
      samplesId: files.name(db, kept.samples, {
        fileName: `${sent.id}.f32`,
        mediaType: 'application/octet-stream',
        at,
      }),
      record: whole,
      uploadedAt: at.toISOString(),
      uploadedById: sender.person?.id ?? null,
      rackId: sender.rackId,
    })
    .run();
  record(db, {
    at,
    person: sender.person,
    actor: sender.actor,
    action: 'kept',
    subject: 'waveform',
    subjectId: sent.id,
    after: {
      lot: lotId,
      unit: sent.unit,
      fileName: sent.fileName,
      sha256: kept.file.sha256,
      samples: whole.samples,
      found: whole.findings.map(({ kind }) => kind),
    },
  });
}

function isKnown(db: Db, id: string): boolean {
  return db.select({ id: waveforms.id }).from(waveforms).where(eq(waveforms.id, id)).get() !== undefined;
}

/**
 * Takes a waveform file in, reads it and keeps it with what it gives. When this returns, it is on the disk; sent again it
 * changes nothing.
 *
 * @throws {Refused} for a file that is no waveform, in words
 * @throws {Problem} for one that is too large, or that breaks off
 */
export async function keepWaveform(
  context: Context,
  lotId: number,
  sender: WaveformSender,
  sent: SentWaveform,
): Promise<{ waveform: Waveform; isNew: boolean }> {
  const { db, files, stream } = context;
  const known = isKnown(db, sent.id);
  if (!known) placeOf(db, lotAtBench(db, lotId), sent);
  const file = await files.receive(sent.stream, sent.most);
  let samples: ReceivedFile | undefined;
  try {
    if (known || isKnown(db, sent.id)) {
      files.discard(file);
      return { waveform: holdKnown(db, lotId, sent, file), isNew: false };
    }
    const read = await readWave(context, file, lotAtBench(db, lotId), db, sent.channel);
    samples = await files.write(read.samples);
    const kept = { file, samples, read };
    db.transaction((tx) => insert(context, tx, lotId, sender, sent, kept));
  } catch (error) {
    files.discard(file);
    if (samples) files.discard(samples);
    throw error;
  }
  stream.announceLot(lotId);
  return { waveform: findWaveform(db, sent.id), isNew: true };
}
