// Compresses the built application's text files once, as hard as it goes, so that the server need not do it in passing.
import { readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { promisify } from 'node:util';
import { brotliCompress } from 'node:zlib';

const compress = promisify(brotliCompress);
const TEXT = /\.(js|css|svg)$/;
/** Smaller files gain nothing. */
const LEAST_BYTES = 600;

async function compressFile(file) {
  const compressed = await compress(readFileSync(file));
  writeFileSync(`${file}.br`, compressed);
}

export async function compressFolder(folder) {
  const files = readdirSync(folder, { recursive: true }).map((name) => path.join(folder, name));
  await Promise.all(files.filter((file) => TEXT.test(file) && statSync(file).size >= LEAST_BYTES).map(compressFile));
}
