import { type RevisionBody } from '#shared/contract/plans';
import { newCharacteristic } from './new-characteristic';
import { PlanDraft } from './plan-draft';

const COARSE = {
  id: 1,
  form: 'digital',
  name: '20 V',
  unit: 'V',
  current: 'dc',
  fullScale: 20,
  resolution: 0.01,
  ofReading: 0.02,
  ofRange: 0,
  counts: 0,
} as const;

function measured(key: string, limits: { lowerLimit?: number; upperLimit?: number } = { upperLimit: 10 }) {
  return { ...newCharacteristic('measured'), key, name: key, ...limits } as RevisionBody['characteristics'][number];
}

function draftOf(...keys: string[]): PlanDraft {
  const draft = new PlanDraft();
  draft.show({
    level: 'II',
    classAqls: [{ class: 'major', aql: '1.0' }],
    characteristics: keys.map((key) => measured(key)),
    decisionRule: 'simple',
    coverageFactor: 2,
    warmUpMinutes: null,
    changeNote: '',
  });
  return draft;
}

const keysOf = (draft: PlanDraft) => draft.content().characteristics.map((each) => each.key);

describe('PlanDraft', () => {
  it('is unchanged when it is shown, and again when a change is taken back', () => {
    const draft = draftOf('no_load', 'loaded');
    expect(draft.changed()).toBe(false);
    draft.move(0, 1);
    expect(draft.changed()).toBe(true);
    draft.move(1, 0);
    expect(draft.changed()).toBe(false);
  });

  it('moves a characteristic and keeps it chosen; the ends of the list hold', () => {
    const draft = draftOf('no_load', 'loaded', 'ripple');
    draft.selectedId.set(draft.rows()[2]?.id ?? null);
    expect(draft.move(2, 0)).toBe(true);
    expect(keysOf(draft)).toEqual(['ripple', 'no_load', 'loaded']);
    expect(draft.selectedIndex()).toBe(0);
    expect(draft.move(0, -1)).toBe(false);
    expect(draft.move(2, 3)).toBe(false);
  });

  it('puts a removed characteristic back where it was', () => {
    const draft = draftOf('no_load', 'loaded', 'ripple');
    const putBack = draft.remove(draft.rows()[1]?.id ?? 0);
    expect(keysOf(draft)).toEqual(['no_load', 'ripple']);
    putBack();
    expect(keysOf(draft)).toEqual(['no_load', 'loaded', 'ripple']);
    expect(draft.changed()).toBe(false);
  });

  it('finds a lower limit above the upper one', () => {
    const draft = draftOf('ripple');
    draft.change(draft.rows()[0]?.id ?? 0, measured('ripple', { lowerLimit: 5, upperLimit: 2 }));
    expect(draft.faults()[0]?.path.slice(0, 2)).toEqual(['characteristics', 0]);
  });

  it('does not take a limit that is not understood for no limit', () => {
    const draft = draftOf('no_load', 'ripple');
    const { id, value } = draft.rows()[1] ?? { id: 0, value: measured('ripple') };
    draft.change(id, value, [{ path: ['upperLimit'], message: 'Type a number.' }]);
    expect(draft.faults()).toEqual([{ path: ['characteristics', 1, 'upperLimit'], message: 'Type a number.' }]);
    draft.move(1, 0);
    expect(draft.faults()[0]?.path).toEqual(['characteristics', 0, 'upperLimit']);
  });

  it('forgets what the server refused as soon as something changes', () => {
    const draft = draftOf('ripple');
    draft.refuse([{ path: ['level'], message: 'Not this level.' }]);
    expect(draft.faults()).toHaveLength(1);
    draft.changeSettings({ level: 'III' });
    expect(draft.faults()).toEqual([]);
  });

  it('tells of guard bands that leave nothing, and can be saved with them', () => {
    const draft = draftOf('loaded');
    draft.instruments.set([{ kind: 'multimeter', status: 'in-service', ranges: [COARSE] }]);
    draft.change(draft.rows()[0]?.id ?? 0, measured('loaded', { lowerLimit: 11.9, upperLimit: 12.1 }));
    expect(draft.guardFaults()).toEqual([]);
    draft.changeSettings({ decisionRule: 'guarded' });
    expect(draft.guardFaults()[0]?.message).toContain('leave nothing to accept');
    expect(draft.faults()).toEqual([]);
  });

  it('does not take a coverage factor that is not understood for the last one', () => {
    const draft = draftOf('loaded');
    draft.changeSettings({ coverageFactor: 2 }, [{ path: ['coverageFactor'], message: 'Type a number.' }]);
    expect(draft.faults()).toEqual([{ path: ['coverageFactor'], message: 'Type a number.' }]);
    draft.changeSettings({ level: 'III' });
    expect(draft.faults()).toHaveLength(1);
    draft.changeSettings({ coverageFactor: 1.65 }, []);
    expect(draft.faults()).toEqual([]);
  });
});
