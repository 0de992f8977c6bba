import { type Database } from '#db/open-database';
import { type Logger } from 'pino';
import { type Clock } from './clock';
import { type Environment } from './environment';
import { type Stream } from './events/stream';
import { type FileStore } from './files/file-store';
import { type Outbox } from './mail/outbox';
import { type Passwords } from './sessions/passwords';
import { type WaveReader } from './waveforms/wave-reader';

/** What every act may use; built once at the start and passed as an argument. */
export interface Context {
  db: Database;
  clock: Clock;
  environment: Environment;
  log: Logger;
  passwords: Passwords;
  outbox: Outbox;
  stream: Stream;
  files: FileStore;
  waves: WaveReader;
}
