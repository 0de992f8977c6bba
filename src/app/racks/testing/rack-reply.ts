import { type Rack } from '#shared/contract/racks';

/** A rack bound to one part, with one token in use and one revoked. */
export function rackReply(given: Partial<Rack> = {}): Rack {
  return {
    id: 2,
    version: 4,
    name: 'North bay',
    place: 'Test room',
    active: true,
    mapping: { 'Vout [V]': 'v_loaded', Operator: null },
    parts: [{ id: 7, number: 'WA-12-500', name: 'Wall adapter 12 V, 500 mA' }],
    tokens: [
      {
        id: 5,
        beginning: 'qrk_a81x',
        issuedAt: '2026-03-02T09:00:00.000Z',
        issuedBy: 'T. Lindqvist',
        lastUsedAt: '2026-03-12T08:14:00.000Z',
        revoked: null,
      },
      {
        id: 4,
        beginning: 'qrk_77Qd',
        issuedAt: '2026-01-08T09:00:00.000Z',
        issuedBy: 'T. Lindqvist',
        lastUsedAt: null,
        revoked: { at: '2026-03-02T09:05:00.000Z', by: 'T. Lindqvist' },
      },
    ],
    ...given,
  };
}
