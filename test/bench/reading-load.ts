import { type ChildProcess, fork } from 'node:child_process';
import path from 'node:path';
import { setTimeout } from 'node:timers/promises';
import { CLIENTS, type ReadingFile } from './reading-file';
import { type NextReading, programRequests, rowRequests } from './reading-requests';
import { PutConnection } from './put-connection';

/** A server in a process of its own. */
export interface LoadedServer {
  /** Readings a second, each client sending the next one as soon as the last is answered. */
  fullSpeed(milliseconds: number): Promise<number>;
  /** Latencies in milliseconds at a steady rate, from the moment a reading was due to be sent. */
  steady(perSecond: number, milliseconds: number): Promise<number[]>;
  stop(): void;
}

/** Connects every client for as long as an act takes: a server closes connections that rest. */
async function connected<T>(port: number, act: (connections: readonly PutConnection[]) => Promise<T>): Promise<T> {
  const connections = await Promise.all(Array.from({ length: CLIENTS }, () => PutConnection.open(port)));
  try {
    return await act(connections);
  } finally {
    for (const connection of connections) connection.close();
  }
}

async function fullSpeed(connections: readonly PutConnection[], next: NextReading, milliseconds: number) {
  const start = performance.now();
  let answered = 0;
  await Promise.all(
    connections.map(async (connection, client) => {
      while (performance.now() - start < milliseconds) {
        await connection.put(next(client));
        answered += 1;
      }
    }),
  );
  return (answered * 1000) / (performance.now() - start);
}

async function steady(connections: readonly PutConnection[], next: NextReading, every: number, milliseconds: number) {
  const start = performance.now();
  const latencies: number[] = [];
  await Promise.all(
    connections.map(async (connection, client) => {
      for (let due = client * every; due < milliseconds; due += connections.length * every) {
        const wait = start + due - performance.now();
        if (wait > 0) await setTimeout(wait);
        await connection.put(next(client));
        latencies.push(performance.now() - start - due);
      }
    }),
  );
  return latencies;
}

/** Starts a server process and waits until it says on which port it listens. */
function started(kind: string, file: string): Promise<{ child: ChildProcess; port: number }> {
  const child = fork(path.resolve('dist/bench/reading-server.js'), [kind, file]);
  return new Promise((resolve, reject) => {
    child.once('message', (message) => {
      resolve({ child, port: (message as { port: number }).port });
    });
    child.once('exit', () => {
      reject(new Error(`The ${kind} server did not start.`));
    });
  });
}

/** Starts the program, or what it is compared with, on a file. */
export async function loadedServer(kind: 'program' | 'bare', file: ReadingFile): Promise<LoadedServer> {
  const { child, port } = await started(kind, file.file);
  const next = kind === 'bare' ? rowRequests(file) : programRequests(file);
  return {
    fullSpeed: (milliseconds) => connected(port, (clients) => fullSpeed(clients, next, milliseconds)),
    steady: (perSecond, milliseconds) =>
      connected(port, (clients) => steady(clients, next, 1000 / perSecond, milliseconds)),
    stop: () => child.disconnect(),
  };
}
