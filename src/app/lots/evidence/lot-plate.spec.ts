import { assessmentOf, lotOf } from '../../../testing/lot-samples';
import { foundWords, lotPlate, plateToSign } from './lot-plate';

const signer = { name: 'M. Aldoush', stampNumber: '02' };
const decidedAt = '2026-03-12T10:00:00.000Z';

describe('The plate of a lot', () => {
  it('shows no verdict before quality has signed it', () => {
    expect(lotPlate(lotOf({ status: 'submitted' }), undefined)).toMatchObject({ variant: 'continue', word: 'TO SIGN' });
    expect(lotPlate(lotOf({ status: 'measuring' }), undefined)).toMatchObject({ variant: 'continue', word: '' });
  });

  it('says stop as soon as a rejection number is reached', () => {
    expect(lotPlate(lotOf({ status: 'measuring', stopped: true }), undefined).variant).toBe('stop');
  });

  it('carries reason and stamp once signed', () => {
    const { groups } = assessmentOf('rejected', 3);
    const lot = lotOf({ status: 'on-hold', verdict: 'rejected', decidedAt, decidedBy: signer });
    expect(lotPlate(lot, groups)).toMatchObject({
      variant: 'rejected',
      at: decidedAt,
      reason: 'Major 3, Re 3',
      stamp: 'M. Aldoush, stamp 02',
    });
  });

  it('tells a held lot from a rejected one', () => {
    expect(lotPlate(lotOf({ status: 'on-hold' }), undefined).variant).toBe('on-hold');
  });

  it('names the class nearest to its acceptance number when nothing is rejected', () => {
    expect(foundWords(assessmentOf('accepted', 1).groups)).toBe('Major 1, Ac 2');
    expect(foundWords(assessmentOf('accepted', 0).groups)).toBe('No unit nonconforming');
  });

  it('says to the signer that it is not signed', () => {
    expect(plateToSign(assessmentOf('accepted', 0))).toMatchObject({ variant: 'accepted', stamp: 'not signed' });
  });
});
