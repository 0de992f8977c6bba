import { type Rack, type RackToken } from '#shared/contract/racks';

/** Tokens that are accepted. */
export function liveTokens({ tokens }: Rack): RackToken[] {
  return tokens.filter(({ revoked }) => revoked === null);
}

/** When a rack called last, by any of its tokens; null when it never did. */
export function lastUse({ tokens }: Rack): string | null {
  const uses = tokens.flatMap(({ lastUsedAt }) => (lastUsedAt === null ? [] : [lastUsedAt]));
  return uses.sort().at(-1) ?? null;
}
