import { type LotHead } from '#shared/contract/lots';
import { type WaveformHead } from '#shared/contract/waveforms';
import { type APIRequestContext } from '@playwright/test';

async function itemsOf<Item>(api: APIRequestContext, path: string): Promise<Item[]> {
  const answer = await api.get(path);
  if (answer.status() !== 200) throw new Error(`${path} answered ${answer.status()}: ${await answer.text()}`);
  return ((await answer.json()) as { items: Item[] }).items;
}

function first<Item>(items: readonly Item[], what: string): Item {
  const [item] = items;
  if (item === undefined) throw new Error(`The demo has no ${what}.`);
  return item;
}

/**
 * What the demo holds, by what it is there for: "{measuring}" in an address is the id of a lot that is being measured. Asked
 * of the program itself, since the demo grows.
 */
export async function demoPlaces(api: APIRequestContext): Promise<(address: string) => string> {
  const lots = (station: string) => itemsOf<LotHead>(api, `/api/lots?station=${station}&limit=50`);
  const [arrivals, bench, decision, released, held] = await Promise.all(
    ['arrivals', 'bench', 'decision', 'released', 'on-hold'].map(lots),
  );
  const ids = (items: readonly { id: number | string }[] | undefined, what: string) => first(items ?? [], what).id;
  const drawn = bench?.filter(({ status }) => status === 'drawn');
  const measuring = bench?.filter(({ status }) => status === 'measuring');
  const measured = first(measuring ?? [], 'lot that is being measured').id;
  const captured = await Promise.all(
    (measuring ?? []).map(({ id }) => itemsOf<WaveformHead>(api, `/api/lots/${id}/waveforms`)),
  );
  const places: Record<string, number | string> = {
    arrived: ids(arrivals, 'lot that waits'),
    drawn: ids(drawn, 'lot with a drawn sample'),
    measuring: measured,
    submitted: ids(decision, 'submitted lot'),
    'submitted-last': ids(decision?.slice(-1), 'submitted lot'),
    released: ids(released, 'released lot'),
    rejected: ids(
      held?.filter(({ verdict }) => verdict === 'rejected'),
      'rejected lot',
    ),
    held: ids(
      held?.filter(({ verdict }) => verdict === null),
      'held lot',
    ),
    certificate: ids(await itemsOf(api, '/api/certificates?limit=1'), 'certificate'),
    nonconformance: ids(await itemsOf(api, '/api/nonconformances?limit=1'), 'nonconformance'),
    waveform: ids(captured.flat(), 'waveform'),
    review: ids(await itemsOf(api, '/api/reviews'), 'review'),
    study: ids(await itemsOf(api, '/api/gauge-studies?limit=1'), 'gauge study'),
  };
  return (address) =>
    address.replaceAll(/\{([a-z-]+)\}/g, (_, name: string) => {
      const id = places[name];
      if (id === undefined) throw new Error(`${address}: nothing is known as ${name}.`);
      return String(id);
    });
}
