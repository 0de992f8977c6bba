import { type Fault } from './production';

/** Where a lot of the demo stands at its last moment. */
export type Ending =
  | { kind: 'waiting' }
  | { kind: 'cancelled'; reason: string }
  | { kind: 'drawn' }
  /** At the bench, so many units measured. */
  | { kind: 'measuring'; units: number }
  | { kind: 'submitted' }
  | { kind: 'decided' }
  | { kind: 'held'; reason: string };

/** A delivery of the demo and what becomes of it. */
export interface DemoLot {
  partNumber: string;
  supplierCode: string;
  deliveryNumber: string;
  orderNumber: string;
  countedQuantity: number;
  statedQuantity: number;
  dateCode: string;
  cartons: number;
  place: string;
  note: string;
  arrivedAt: Date;
  neededBy: Date | null;
  /** When the sample is drawn and measuring begins; of no meaning for lots that wait. */
  drawnAt: Date;
  /** Decides the drawn positions and the units' physics. */
  seed: number;
  fault: Fault;
  /** Who measures: 0 or 1. */
  bench: 0 | 1;
  /** Whether an automated rack takes the electrical readings. */
  byRack: boolean;
  /** Whether measuring ends as soon as the rejection is certain. */
  endsAtStop: boolean;
  /** The unit that its inspector sets aside. */
  setAside: { unit: number; reason: string } | null;
  /** Whether the inspector captures the waveform of a unit. */
  captured: boolean;
  ending: Ending;
}
