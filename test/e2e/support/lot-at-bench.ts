import { type Lot } from '#shared/contract/lots';
import { expect, type APIRequestContext } from '@playwright/test';

/** Books a lot of a part in and draws its sample, by the interface. */
export async function lotAtBench(
  receiving: APIRequestContext,
  inspector: APIRequestContext,
  lot: { partId: number; quantity: number },
): Promise<Lot> {
  const booked = await receiving.post('/api/lots', {
    data: {
      partId: lot.partId,
      supplierId: 1,
      deliveryNumber: 'D-9002',
      orderNumber: 'PO-9002',
      countedQuantity: lot.quantity,
      statedQuantity: lot.quantity,
      dateCode: '2646',
      cartons: 10,
      neededBy: null,
      place: 'Cage 4',
      note: '',
    },
  });
  expect(booked.status(), await booked.text()).toBe(201);
  const { id, version } = (await booked.json()) as Lot;
  const drawn = await inspector.post(`/api/lots/${id}/sample`, { headers: { 'if-match': `"${version}"` } });
  expect(drawn.status(), await drawn.text()).toBe(201);
  return (await drawn.json()) as Lot;
}
