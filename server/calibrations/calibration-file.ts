import { type Db } from '#db/open-database';
import { calibrations } from '#db/schema/calibrations';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { Conflict, NotFound, Refused } from '#server/problems';
import { attachCalibrationFile, type Calibration } from '#shared/contract/calibrations';
import { and, eq } from 'drizzle-orm';
import { closeSync, openSync, readSync } from 'node:fs';
import { type Readable } from 'node:stream';
import { findCalibration } from './calibration-view';

interface NamedCalibration {
  instrumentId: number;
  id: number;
}

/** Kinds of file that a certificate comes as, each known by its first bytes, whatever it is called. */
const KINDS = [
  { mediaType: 'application/pdf', begins: [0x25, 0x50, 0x44, 0x46, 0x2d] },
  { mediaType: 'image/png', begins: [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a] },
  { mediaType: 'image/jpeg', begins: [0xff, 0xd8, 0xff] },
] as const;

function mediaTypeOf(path: string): string {
  const first = Buffer.alloc(8);
  const handle = openSync(path, 'r');
  readSync(handle, first);
  closeSync(handle);
  const kind = KINDS.find(({ begins }) => begins.every((byte, at) => first[at] === byte));
  if (kind) return kind.mediaType;
  const message = 'This is no PDF, PNG or JPEG file.';
  throw new Refused('file-refused', message, [{ path: ['file'], message }]);
}

function rowOf(db: Db, { instrumentId, id }: NamedCalibration) {
  const row = db
    .select()
    .from(calibrations)
    .where(and(eq(calibrations.id, id), eq(calibrations.instrumentId, instrumentId)))
    .get();
  if (!row) throw new NotFound('This calibration');
  return row;
}

function holdWithout(db: Db, named: NamedCalibration): void {
  if (rowOf(db, named).fileId !== null)
    throw new Conflict('file-there-already', 'This calibration has its certificate already; it stays.');
}

/**
 * Attaches the certificate of a calibration, once.
 *
 * @throws {Refused} for a file of another kind
 */
export async function attachFile(
  { db, clock, files }: Context,
  caller: Caller,
  named: NamedCalibration,
  sent: { fileName: string; stream: Readable },
): Promise<Calibration> {
  holdWithout(db, named);
  const file = await files.receive(sent.stream, attachCalibrationFile.upload ?? 0);
  const at = clock.now();
  try {
    const mediaType = mediaTypeOf(file.path);
    db.transaction((tx) => {
      holdWithout(tx, named);
      const fileId = files.name(tx, file, { fileName: sent.fileName, mediaType, at });
      tx.update(calibrations).set({ fileId }).where(eq(calibrations.id, named.id)).run();
      record(tx, {
        at,
        person: caller,
        action: 'certificate attached',
        subject: 'instrument',
        subjectId: named.instrumentId,
        after: { calibration: named.id, fileName: sent.fileName, sha256: file.sha256 },
      });
    });
  } catch (error) {
    files.discard(file);
    throw error;
  }
  return findCalibration(db, named.instrumentId, named.id);
}

/** Where the certificate of a calibration lies. @throws {NotFound} where it has none */
export function calibrationFile({ db, files }: Context, named: NamedCalibration) {
  const { fileId } = rowOf(db, named);
  if (fileId === null) throw new NotFound('The certificate of this calibration');
  return files.find(db, fileId);
}
