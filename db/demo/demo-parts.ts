import { type DemoPart, rectified, switching } from './demo-part';

/** Lots of adapters come by the thousand, open frames by the hundred. */
const ADAPTER_LOTS = [800, 1000, 1200, 1200, 2400];
const FRAME_LOTS = [160, 240, 320, 480];

/** The parts of the demo with what their plans ask for. */
export const DEMO_PARTS: readonly DemoPart[] = [
  {
    body: {
      number: 'WA-12-500',
      name: 'Wall adapter 12 V, 500 mA',
      form: 'wall-adapter',
      model: rectified({
        topology: 'bridge',
        ratedVolts: 12,
        ratedAmperes: 0.5,
        peakVolts: 18.2,
        sourceOhms: 2.6,
        microfarads: 1500,
      }),
      active: true,
    },
    limits: {
      noLoadVolts: [15.8, 18.2],
      loadedVolts: [11.4, 12.9],
      rippleVolts: 2.4,
      regulation: 0.5,
      balance: null,
      noLoadWatts: null,
      currentLimitAmperes: null,
    },
    suppliers: ['KES', 'BAL', 'OMD'],
    lotSizes: [1200],
  },
  {
    body: {
      number: 'WA-09-300',
      name: 'Wall adapter 9 V, 300 mA',
      form: 'wall-adapter',
      model: rectified({
        topology: 'half-wave',
        ratedVolts: 9,
        ratedAmperes: 0.3,
        peakVolts: 12.2,
        sourceOhms: 0.9,
        microfarads: 3300,
      }),
      active: true,
    },
    limits: {
      noLoadVolts: [10.9, 12.5],
      loadedVolts: [8.6, 10],
      rippleVolts: 2,
      regulation: 0.36,
      balance: null,
      noLoadWatts: null,
      currentLimitAmperes: null,
    },
    suppliers: ['KES', 'BAL'],
    lotSizes: ADAPTER_LOTS,
  },
  {
    body: {
      number: 'WA-24-400',
      name: 'Wall adapter 24 V, 400 mA',
      form: 'wall-adapter',
      model: rectified({
        topology: 'bridge',
        ratedVolts: 24,
        ratedAmperes: 0.4,
        peakVolts: 32.6,
        sourceOhms: 4.6,
        microfarads: 1000,
      }),
      active: true,
    },
    limits: {
      noLoadVolts: [29.5, 33.5],
      loadedVolts: [22.8, 25.8],
      rippleVolts: 3.2,
      regulation: 0.38,
      balance: null,
      noLoadWatts: null,
      currentLimitAmperes: null,
    },
    suppliers: ['KES', 'OMD'],
    lotSizes: [600, 750, 900],
  },
  {
    body: {
      number: 'WA-06-800',
      name: 'Wall adapter 6 V, 800 mA',
      form: 'wall-adapter',
      model: switching(6, 0.8),
      active: true,
    },
    limits: {
      noLoadVolts: [5.7, 6.3],
      loadedVolts: [5.7, 6.3],
      rippleVolts: 0.12,
      regulation: 0.04,
      balance: null,
      noLoadWatts: 0.1,
      currentLimitAmperes: null,
    },
    suppliers: ['BAL'],
    lotSizes: ADAPTER_LOTS,
  },
  {
    body: {
      number: 'OF-24-2A5',
      name: 'Open frame 24 V, 2.5 A',
      form: 'open-frame',
      model: rectified({
        topology: 'centre-tap',
        ratedVolts: 24,
        ratedAmperes: 2.5,
        peakVolts: 30.2,
        sourceOhms: 0.55,
        microfarads: 10000,
      }),
      active: true,
    },
    limits: {
      noLoadVolts: [27.5, 31.5],
      loadedVolts: [22.5, 25.4],
      rippleVolts: 2.6,
      regulation: 0.34,
      balance: 0.03,
      noLoadWatts: null,
      currentLimitAmperes: null,
    },
    suppliers: ['BAL', 'OMD'],
    lotSizes: FRAME_LOTS,
  },
  {
    body: {
      number: 'OF-12-3A0',
      name: 'Open frame 12 V, 3 A',
      form: 'open-frame',
      model: rectified({
        topology: 'centre-tap',
        ratedVolts: 12,
        ratedAmperes: 3,
        peakVolts: 15.6,
        sourceOhms: 0.22,
        microfarads: 15000,
      }),
      active: true,
    },
    limits: {
      noLoadVolts: [14, 16],
      loadedVolts: [11.3, 12.9],
      rippleVolts: 1.8,
      regulation: 0.36,
      balance: 0.03,
      noLoadWatts: null,
      currentLimitAmperes: null,
    },
    suppliers: ['BAL', 'OMD'],
    lotSizes: FRAME_LOTS,
  },
  {
    body: {
      number: 'OF-05-4A0',
      name: 'Open frame 5 V, 4 A',
      form: 'open-frame',
      model: switching(5, 4),
      active: true,
    },
    limits: {
      noLoadVolts: [4.85, 5.15],
      loadedVolts: [4.8, 5.15],
      rippleVolts: 0.08,
      regulation: 0.03,
      balance: null,
      noLoadWatts: null,
      currentLimitAmperes: [4.4, 6],
    },
    suppliers: ['KES', 'OMD'],
    lotSizes: FRAME_LOTS,
  },
];

/** @throws {RangeError} for a number that the demo does not have */
export function demoPart(number: string): DemoPart {
  const found = DEMO_PARTS.find(({ body }) => body.number === number);
  if (!found) throw new RangeError(`The demo has no part ${number}.`);
  return found;
}
