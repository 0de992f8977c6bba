import { type RackLot, type sendRackReadings, type sendRackWaveform } from '#shared/contract/racks';
import { REQUESTS_A_MINUTE } from '#server/racks/rack-limit';
import type * as z from 'zod';

type Sent = z.input<(typeof sendRackReadings)['body']>;
type Kept = z.input<(typeof sendRackReadings)['reply']>;

export const EXAMPLE_LOT: RackLot = {
  lot: { number: 'L-26-0412', status: 'drawn', quantity: 1200 },
  part: { number: 'HC-1205', name: 'Adapter 12 V 0.5 A' },
  plan: { number: 'P-014', revision: 4 },
  sampleSize: 80,
  characteristics: [
    {
      key: 'v_loaded',
      name: 'Loaded voltage',
      kind: 'measured',
      condition: 'at 500 mA',
      unit: 'V',
      lowerLimit: 11.4,
      upperLimit: 12.6,
      instrumentKind: 'multimeter',
    },
    {
      key: 'marking',
      name: 'Marking',
      kind: 'attribute',
      condition: '',
      unit: '',
      lowerLimit: null,
      upperLimit: null,
      instrumentKind: null,
    },
  ],
  wanted: [
    { unit: 1, position: 37, characteristicKeys: ['v_loaded', 'marking'] },
    { unit: 2, position: 814, characteristicKeys: ['v_loaded', 'marking'] },
  ],
};

export const EXAMPLE_READINGS: Sent = {
  readings: [
    {
      id: 'run-7731/1/v_loaded',
      unit: 1,
      characteristicKey: 'v_loaded',
      value: 12.04,
      takenAt: '2026-03-12T08:15:02Z',
      instrument: 'MM-04',
      rangeName: '20 V',
    },
    {
      id: 'run-7731/1/marking',
      unit: 1,
      characteristicKey: 'marking',
      pass: true,
      takenAt: '2026-03-12T08:15:04Z',
      instrument: null,
    },
  ],
};

export const EXAMPLE_ANSWER: Kept = {
  kept: 2,
  known: 0,
  questions: 0,
  verdict: 'continue',
  stop: false,
  reason: 'No rejection number reached, 1 of 80 units judged.',
};

export const EXAMPLE_WAVEFORM_ANSWER: z.input<(typeof sendRackWaveform)['reply']> = {
  id: '5e0c7d1e-9a53-8b41-9d2c-0f6f6e1f4a10',
  kept: true,
  samples: 50_000,
  peakToPeak: 0.412,
  findings: [
    {
      kind: 'nothing-unusual',
      evidence: 'The ripple is 412 mV peak to peak; sound units of this part give 310 mV to 520 mV.',
      cause: 'Nothing points to a fault of the rectifier.',
    },
  ],
};

const json = (value: unknown) => JSON.stringify(value, null, 2);

/** A step of the conversation: what it is for, what is typed, what comes back. */
interface Step {
  about: string;
  typed: string;
  answer?: string;
}

/** The whole conversation of a rack, from its token to the answer about its readings. */
export const RACK_STEPS: readonly Step[] = [
  {
    about:
      'An administrator adds the rack (Records, Racks), chooses its parts and issues a token. The token is shown once; the rack keeps it where nobody else reads it.',
    typed: 'SITE=https://quietrail.hollowmere.example\nTOKEN=qrk_your-token',
  },
  {
    about:
      'The rack asks what it is to measure of a lot whose sample is drawn. Values and limits are in the unit that stands beside them, without a prefix; units are numbered as they were drawn, and position says which unit of the lot each one is.',
    typed: 'curl -H "Authorization: Bearer $TOKEN" "$SITE/api/rack/lots/L-26-0412"',
    answer: json(EXAMPLE_LOT),
  },
  {
    about:
      'It sends readings, up to 2 000 at once, each under an id of its own. All are kept or none: a fault is named by its place, as ["readings", 1, "value"]. Readings far from what the part can give are kept and counted as questions: a person answers them before the lot is submitted.',
    typed: `curl -H "Authorization: Bearer $TOKEN" -H "Content-Type: application/json" \\\n  --data @readings.json "$SITE/api/rack/lots/L-26-0412/readings"\n\n# readings.json\n${json(EXAMPLE_READINGS)}`,
    answer: json(EXAMPLE_ANSWER),
  },
  {
    about:
      'When no answer comes, it sends the same again until one does; what is here already is counted as known and changes nothing. Another reading under the same id is refused with 409.',
    typed: `curl -H "Authorization: Bearer $TOKEN" -H "Content-Type: application/json" \\\n  --data @readings.json "$SITE/api/rack/lots/L-26-0412/readings"`,
    answer: json({ ...EXAMPLE_ANSWER, kept: 0, known: 2 } satisfies Kept),
  },
  {
    about:
      'It sends a waveform of a unit as its oscilloscope wrote it: a table (CSV) of times and voltages with any delimiter. The id at the end of the address is the rack’s own; sent again, it changes nothing. The answer says what the waveform shows; the bench lists it with the unit.',
    typed: `curl -H "Authorization: Bearer $TOKEN" -H "Content-Type: text/csv" -T run-7731-1.csv \\\n  "$SITE/api/rack/lots/L-26-0412/waveforms/run-7731-1?unit=1&characteristicKey=ripple_pp&fileName=run-7731-1.csv"`,
    answer: json(EXAMPLE_WAVEFORM_ANSWER),
  },
];

/** What a rack does about each refusal. */
export const RACK_REFUSALS: readonly { status: number; means: string }[] = [
  { status: 400, means: 'The request has not the shape; errors name each field. Mend the program.' },
  { status: 401, means: 'The token is not accepted: it is wrong or revoked. Ask for a new one.' },
  { status: 403, means: 'The rack is out of use, or not set up for this part; the title says which.' },
  { status: 404, means: 'There is no such lot.' },
  { status: 409, means: 'The lot is not at the bench, or an id was used for another reading or waveform.' },
  { status: 413, means: 'The waveform file is larger than 150 MB.' },
  {
    status: 422,
    means: 'A rule of the plan refuses readings; errors name each one; or the file is no waveform. None was kept.',
  },
  {
    status: 429,
    means: `More than ${REQUESTS_A_MINUTE} requests in a minute with one token. Wait as Retry-After says, and send more readings at once.`,
  },
];
