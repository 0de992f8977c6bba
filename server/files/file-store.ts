import { type Db } from '#db/open-database';
import { storedFiles } from '#db/schema/stored-files';
import { NotFound, Problem } from '#server/problems';
import { eq } from 'drizzle-orm';
import { createHash, randomUUID } from 'node:crypto';
import { createWriteStream, mkdirSync, openSync, closeSync, fsyncSync, readdirSync, renameSync, rmSync } from 'node:fs';
import { writeFile } from 'node:fs/promises';
import path from 'node:path';
import { type Readable, Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';

/** A file that lies in the folder and is not yet named by the database. */
export interface ReceivedFile {
  /** Its random name. */
  id: string;
  path: string;
  bytes: number;
  sha256: string;
}

const UNFINISHED = '.part';
/** How many times the allowed size an upload may have before its connection is cut. */
const HEARD_OUT = 4;

/** Megabytes as people count them. */
function megabytes(bytes: number): string {
  return `${Math.floor(bytes / 1_000_000)} MB`;
}

function syncToDisk(file: string): void {
  const handle = openSync(file, 'r+');
  fsyncSync(handle);
  closeSync(handle);
}

/**
 * Uploaded files, under random names in a folder of their own outside of what is served. A file is on the disk before the
 * transaction that names it; what no row names after a stop in between is removed at the next start.
 */
export class FileStore {
  constructor(private readonly folder: string) {
    mkdirSync(folder, { recursive: true });
  }

  pathOf(id: string): string {
    return path.join(this.folder, id);
  }

  /**
   * Takes an upload in as it comes.
   *
   * @throws {Problem} 413 for more than `most` bytes, 400 when it breaks off
   */
  async receive(stream: Readable, most: number): Promise<ReceivedFile> {
    const id = randomUUID();
    const unfinished = this.pathOf(id + UNFINISHED);
    const hash = createHash('sha256');
    let bytes = 0;
    const tooLarge = () => new Problem(413, 'too-large', `The file is larger than ${megabytes(most)}.`);
    const measure = new Transform({
      transform(chunk: Buffer, _encoding, done) {
        bytes += chunk.length;
        hash.update(chunk);
        if (bytes <= most) done(null, chunk);
        // The rest is heard out, so that the answer reaches a sender who does not listen while it sends; up to a point.
        else if (bytes <= most * HEARD_OUT) done();
        else done(tooLarge());
      },
    });
    try {
      await pipeline(stream, measure, createWriteStream(unfinished));
    } catch (error) {
      rmSync(unfinished, { force: true });
      if (stream.readableAborted) throw new Problem(400, 'upload-broken', 'The upload broke off; nothing was kept.');
      throw error;
    }
    if (bytes > most) {
      rmSync(unfinished);
      throw tooLarge();
    }
    return { ...this.finish(id), bytes, sha256: hash.digest('hex') };
  }

  /** Keeps bytes that the program made itself. */
  async write(bytes: Uint8Array): Promise<ReceivedFile> {
    const id = randomUUID();
    await writeFile(this.pathOf(id + UNFINISHED), bytes);
    const sha256 = createHash('sha256').update(bytes).digest('hex');
    return { ...this.finish(id), bytes: bytes.length, sha256 };
  }

  /** Names a received file in the database, inside the transaction that uses it. */
  name(db: Db, file: ReceivedFile, as: { fileName: string; mediaType: string; at: Date }): string {
    const { id, bytes, sha256 } = file;
    const { fileName, mediaType, at } = as;
    db.insert(storedFiles).values({ id, bytes, sha256, fileName, mediaType, receivedAt: at.toISOString() }).run();
    return id;
  }

  /** Where a named file lies, and what it is. @throws {NotFound} */
  find(db: Db, id: string): { filePath: string; fileName: string; mediaType: string } {
    const row = db.select().from(storedFiles).where(eq(storedFiles.id, id)).get();
    if (!row) throw new NotFound('This file');
    return { filePath: this.pathOf(id), fileName: row.fileName, mediaType: row.mediaType };
  }

  /** Removes a received file that is not used after all. */
  discard({ id }: ReceivedFile): void {
    rmSync(this.pathOf(id), { force: true });
  }

  /** Removes what no row names: uploads that a stop of the program cut off. */
  sweep(db: Db): void {
    const named = new Set(
      db
        .select({ id: storedFiles.id })
        .from(storedFiles)
        .all()
        .map(({ id }) => id),
    );
    for (const file of readdirSync(this.folder)) if (!named.has(file)) rmSync(this.pathOf(file), { force: true });
  }

  private finish(id: string): { id: string; path: string } {
    const unfinished = this.pathOf(id + UNFINISHED);
    syncToDisk(unfinished);
    renameSync(unfinished, this.pathOf(id));
    syncFolder(this.folder);
    return { id, path: this.pathOf(id) };
  }
}

/** A new name survives a power cut once its folder is on the disk. */
function syncFolder(folder: string): void {
  const handle = openSync(folder, 'r');
  fsyncSync(handle);
  closeSync(handle);
}
