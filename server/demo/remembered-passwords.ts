import { type Passwords } from '#server/sessions/passwords';

/** Compares each password with each hash once and remembers the answer: the demo signs dozens of times with the same one. */
export function rememberedPasswords(passwords: Passwords): Passwords {
  const known = new Map<string, Promise<boolean>>();
  return {
    hash: (password) => passwords.hash(password),
    matches: (password, hash) => {
      const key = JSON.stringify([password, hash]);
      const answer = known.get(key) ?? passwords.matches(password, hash);
      known.set(key, answer);
      return answer;
    },
    close: () => Promise.resolve(),
  };
}
