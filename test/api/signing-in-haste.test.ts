import { certificateStatuses } from '#db/schema/certificates';
import { makeMissingFiles } from '#server/certificates/make-certificate-file';
import { certificatePdf } from '#server/documents/certificate-pdf';
import { type Lot } from '#shared/contract/lots';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { keep, lotNow, planOf, submit, typedReading } from '../support/bench-acts';
import { addPlannedPart, drawnLot, measured } from '../support/bench-fixtures';
import { PASSWORD } from '../support/test-people';
import { testSite, type TestSite } from '../support/test-site';

vi.mock('#server/documents/certificate-pdf', { spy: true });

let site: TestSite;
beforeEach(async () => {
  site = await testSite({ signInAttempts: 5 });
});
afterEach(() => {
  vi.mocked(certificatePdf).mockReset();
  site.close();
});

async function acceptable(): Promise<Lot> {
  const plan = planOf(measured('v_loaded', 'major', { lower: 11.4 }));
  const lot = await drawnLot(site, addPlannedPart(site.db, site.people.quality.id, plan), 1);
  await keep(site, lot, typedReading(1, 'v_loaded', '12.1')).expect(200);
  await submit(site, lot).expect(200);
  return lotNow(site, lot);
}

function sign(lot: Lot, password = PASSWORD) {
  return site
    .as('quality')
    .post(`/api/lots/${lot.id}/decision`)
    .set('if-match', `"${lot.version}"`)
    .send({ verdict: 'accepted', password, note: '' });
}

describe('passwords tried at signing', () => {
  it('are limited also when they are tried all at once', async () => {
    const lot = await acceptable();
    const { passwords } = site.context;
    // Every attempt is checked only when all have come in, as by a thread that is slower than they are.
    let comeIn = 0;
    let open = (): void => undefined;
    const allIn = new Promise<void>((resolve) => (open = resolve));
    site.context.passwords = {
      ...passwords,
      matches: async (password, hash) => {
        if (++comeIn === 12) open();
        await allIn;
        return passwords.matches(password, hash);
      },
    };
    const guesses = Array.from({ length: 11 }, (_, at) => sign(lot, `guess ${at}`).then(({ status }) => status));
    await new Promise((resolve) => setTimeout(resolve, 200));
    const right = sign(lot).then(({ status }) => status);
    const answers = await Promise.all([...guesses, right]);
    expect(answers.filter((status) => status === 422).length).toBeLessThanOrEqual(5);
    expect(answers.filter((status) => status === 200)).toEqual([]);
    expect((await lotNow(site, lot)).status).toBe('submitted');
  });
});

describe('a certificate whose file cannot be made', () => {
  it('stays being issued; the release stands, and the file is made at the next start', async () => {
    const lot = await acceptable();
    vi.mocked(certificatePdf).mockRejectedValueOnce(new Error('no fonts'));
    const { body } = await sign(lot).expect(200);
    const { certificate } = body as Lot;
    expect(body).toMatchObject({ status: 'released', certificate: { number: 'CC-26-0001' } });
    const shown = async () => (await site.as('quality').get(`/api/certificates/${certificate?.id}`)).body as unknown;
    expect(await shown()).toMatchObject({ status: 'issuing', sha256: null });
    vi.mocked(certificatePdf).mockRejectedValueOnce(new Error('still no fonts'));
    await site.as('quality').get(`/api/certificates/${certificate?.id}/file`).expect(409);

    vi.mocked(certificatePdf).mockRejectedValueOnce(new Error('no fonts yet'));
    await makeMissingFiles(site.context);
    expect(await shown()).toMatchObject({ status: 'issuing' });

    await makeMissingFiles(site.context);
    expect(await shown()).toMatchObject({ status: 'valid' });
    await site.as('quality').get(`/api/certificates/${certificate?.id}/file`).expect(200);
    expect(site.db.select().from(certificateStatuses).all()).toHaveLength(2);
  });

  it('is made when somebody opens it', async () => {
    const lot = await acceptable();
    vi.mocked(certificatePdf).mockRejectedValueOnce(new Error('no fonts'));
    const { body } = await sign(lot).expect(200);
    const { certificate } = body as Lot;
    await site.as('quality').get(`/api/certificates/${certificate?.id}/file`).expect(200);
  });
});
