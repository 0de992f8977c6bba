import { type Context } from '#server/context';
import { keepWaveform, type SentWaveform } from '#server/waveforms/keep-waveform';
import { type sendRackWaveform } from '#shared/contract/racks';
import { LARGEST_WAVEFORM } from '#shared/contract/waveforms';
import type * as z from 'zod';
import { ownReadingId } from './own-reading-id';
import { type RackCaller } from './rack-caller';
import { lotOfRack } from './rack-lot';

type Reply = z.input<(typeof sendRackWaveform)['reply']>;

/** Keeps a waveform that a rack sends by itself. Sent again, under the rack's own id, it changes nothing. */
export async function keepRackWaveform(
  context: Context,
  rack: RackCaller,
  { number, own }: { number: string; own: string },
  sent: Omit<SentWaveform, 'id' | 'most'>,
): Promise<Reply> {
  const { lot } = lotOfRack(context.db, rack, number);
  const { waveform, isNew } = await keepWaveform(
    context,
    lot.id,
    { person: null, actor: `Rack ${rack.name}`, rackId: rack.id },
    { ...sent, id: ownReadingId(rack.id, lot.id, `waveform ${own}`), most: LARGEST_WAVEFORM },
  );
  const { id, samples, values, findings } = waveform;
  return { id, kept: isNew, samples, peakToPeak: values.peakToPeak, findings };
}
