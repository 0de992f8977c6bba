import { characteristic, type Characteristic, type StoredCharacteristic } from '#shared/contract/plans';

/** A stored characteristic with the fields that came after it at their usual values: a revision is never edited for them. */
export function wholeCharacteristic(stored: StoredCharacteristic): Characteristic {
  return characteristic.parse(stored);
}
