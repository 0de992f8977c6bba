import { type Response } from 'supertest';

/** The Set-Cookie lines of an answer. */
export function setCookies(answer: Response): string[] {
  const lines: unknown = answer.headers['set-cookie'];
  return Array.isArray(lines) ? lines.map(String) : [];
}

/** The Set-Cookie line of one cookie; empty when it is not set. */
export function setCookie(answer: Response, name: string): string {
  return setCookies(answer).find((line) => line.startsWith(`${name}=`)) ?? '';
}

/** A cookie as a browser sends it back. */
export function sentBack(answer: Response, name: string): string {
  return setCookie(answer, name).split(';')[0] ?? '';
}
