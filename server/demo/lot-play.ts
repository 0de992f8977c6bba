import { type DemoLot } from '#db/demo/demo-lot';
import { benchWork, type TypedReading } from '#db/demo/bench-work';
import { type Chance, chanceOf } from '#db/demo/chance';
import { demoPart } from '#db/demo/demo-parts';
import { demoWave } from '#db/demo/demo-wave';
import { productionOf } from '#db/demo/production';
import { isReadByRack, RACK_MAPPING, rackFile } from '#db/demo/rack-file';
import { type UnitTruth, unitTruth } from '#db/demo/unit-readings';
import { later } from '#db/demo/work-days';
import { setUnitAside, submitLot } from '#server/bench/change-bench';
import { importRackFile } from '#server/bench/rack-import';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { dayOf } from '#server/instruments/instrument-queries';
import { type RunningVerdicts } from '#server/judging/running-verdicts';
import { bookLot, cancelLot } from '#server/lots/book-lot';
import { drawSample } from '#server/lots/draw-sample';
import { findLot } from '#server/lots/lot-rows';
import { keepWaveform } from '#server/waveforms/keep-waveform';
import { type Lot } from '#shared/contract/lots';
import { LARGEST_WAVEFORM } from '#shared/contract/waveforms';
import { randomUUID } from 'node:crypto';
import { Readable } from 'node:stream';
import { type Agenda } from './agenda';
import { benchInstrument } from './bench-instruments';
import { BenchSession } from './bench-session';
import { type Cast } from './cast';
import { signLot } from './sign-lot';
import { RunningSample } from './running-sample';
import { type Stage } from './stage';

/** What every lot of the demo is played with. */
export interface LotStage {
  context: Context;
  verdicts: RunningVerdicts;
  agenda: Agenda;
  cast: Cast;
  stage: Stage;
  /** Waits until the notices of a rejection are on their way. */
  noticesSent(): Promise<void>;
}

const RACK_MINUTES = 35;
/** How long after the draw a waveform is captured, and of one of how many units. */
const CAPTURE_MINUTES = 14;
const CAPTURED_AMONG = 6;
const RACK_KINDS = ['multimeter', 'oscilloscope', 'insulation-tester'];

function idOf(ids: ReadonlyMap<string, number>, name: string): number {
  const id = ids.get(name);
  if (id === undefined) throw new Error(`The demo has no ${name}.`);
  return id;
}

/** One lot of the demo, from the dock to where it stands at the end. */
export class LotPlay {
  private readonly chance: Chance;
  private readonly inspector: Caller;
  private id = 0;

  constructor(
    private readonly on: LotStage,
    private readonly lot: DemoLot,
  ) {
    this.chance = chanceOf(lot.seed);
    this.inspector = on.cast.inspectors[lot.bench];
    on.agenda.add(lot.arrivedAt, () => this.arrive());
  }

  private arrive(): void {
    const { context, agenda, cast, stage } = this.on;
    const { deliveryNumber, orderNumber, countedQuantity, statedQuantity, dateCode, cartons, place, note } = this.lot;
    const booked = bookLot(context, cast.receiving, {
      partId: idOf(stage.partIds, this.lot.partNumber),
      supplierId: idOf(stage.supplierIds, this.lot.supplierCode),
      ...{ deliveryNumber, orderNumber, countedQuantity, statedQuantity, dateCode, cartons, place, note },
      neededBy: this.lot.neededBy?.toISOString() ?? null,
    });
    this.id = booked.id;
    const { ending } = this.lot;
    if (ending.kind === 'waiting') return;
    if (ending.kind === 'cancelled')
      agenda.add(later(this.lot.arrivedAt, 9), () => {
        cancelLot(context, cast.receiving, this.id, booked.version, ending.reason);
      });
    else agenda.add(this.lot.drawnAt, () => this.draw(booked.version));
  }

  private draw(version: number): void {
    const { context, agenda } = this.on;
    const drawn = drawSample(context, this.inspector, this.id, version, this.lot.seed);
    if (this.lot.ending.kind === 'drawn') return;
    const truths = this.truths(drawn);
    if (this.lot.captured) agenda.add(later(this.lot.drawnAt, CAPTURE_MINUTES), () => this.capture(truths));
    if (!this.lot.byRack) this.measure(truths, later(this.lot.drawnAt, this.chance.between(3, 6)));
    else agenda.add(later(this.lot.drawnAt, RACK_MINUTES), () => this.importRack(drawn.number, truths));
  }

  /** Captures the waveform of the unit with the most ripple among the first ones. */
  private async capture(truths: readonly UnitTruth[]): Promise<void> {
    const part = demoPart(this.lot.partNumber);
    const ripples = truths.slice(0, CAPTURED_AMONG).map(({ values }) => values.get('ripple_pp') ?? 0);
    const most = Math.max(...ripples);
    const unit = ripples.indexOf(most) + 1;
    const wave = demoWave(part, this.lot.fault, most, this.chance);
    if (wave === undefined) return;
    await keepWaveform(
      this.on.context,
      this.id,
      { person: this.inspector, rackId: null },
      {
        id: randomUUID(),
        fileName: `${this.lot.deliveryNumber}-unit-${unit}.csv`,
        unit,
        characteristicKey: 'ripple_pp',
        stream: Readable.from([Buffer.from(wave)]),
        most: LARGEST_WAVEFORM,
      },
    );
  }

  private truths({ sampleSize }: Lot): UnitTruth[] {
    const part = demoPart(this.lot.partNumber);
    const production = productionOf(this.lot.fault, this.chance);
    return Array.from({ length: sampleSize ?? 0 }, (_, index) => unitTruth(part, index + 1, production, this.chance));
  }

  private sample(): RunningSample {
    const { db } = this.on.context;
    return new RunningSample(db, findLot(db, this.id).lot);
  }

  private importRack(number: string, truths: readonly UnitTruth[]): void {
    const { context, verdicts } = this.on;
    const at = context.clock.now();
    const instrumentIds = RACK_KINDS.flatMap((kind) => this.instrumentFor(kind, dayOf(at)) ?? []);
    const text = rackFile(this.sample().work(), truths);
    importRackFile(context, verdicts, this.inspector, this.id, {
      fileName: `rack2-${number}.csv`,
      text,
      instrumentIds,
      rackId: this.on.stage.rackId,
      mapping: { ...RACK_MAPPING },
    });
    this.measure(truths, later(at, 3));
  }

  private measure(truths: readonly UnitTruth[], from: Date): void {
    const sample = this.sample();
    const byHand = sample.work().filter(({ content }) => !this.lot.byRack || !isReadByRack(content.key));
    const session = new BenchSession(this.on.context, this.on.agenda, {
      lotId: this.id,
      inspector: this.inspector,
      sample,
      work: this.withoutRest(benchWork(byHand, truths, from, this.chance)),
      endsAtStop: this.lot.endsAtStop,
      instrumentFor: (kind, day) => this.instrumentFor(kind, day),
      afterwards: (at) => this.afterMeasuring(at),
    });
    session.goOn();
  }

  /** A lot still at the bench is measured so far and no farther; of a unit set aside little is read. */
  private withoutRest(work: readonly TypedReading[]): TypedReading[] {
    const { ending, setAside } = this.lot;
    const units = ending.kind === 'measuring' ? ending.units : Infinity;
    const notOn = ({ unit, key }: TypedReading) => unit === setAside?.unit && key !== 'marking' && key !== 'polarity';
    return work.filter((one) => one.unit <= units && !notOn(one));
  }

  private instrumentFor(kind: string | null, day: string): number | null {
    return benchInstrument(this.on.stage.instruments, this.lot.bench, kind, day);
  }

  private afterMeasuring(at: Date): void {
    const { context, verdicts, agenda } = this.on;
    const { setAside, ending } = this.lot;
    if (setAside)
      agenda.add(later(at, 0.5), () => {
        setUnitAside(context, verdicts, this.inspector, this.id, setAside.unit, setAside.reason);
      });
    if (ending.kind !== 'measuring') agenda.add(later(at, this.chance.between(2, 6)), () => this.submit());
  }

  private submit(): void {
    const { context, verdicts, agenda, cast } = this.on;
    const { version } = findLot(context.db, this.id).lot;
    submitLot(context, verdicts, this.inspector, this.id, version);
    const { ending } = this.lot;
    if (ending.kind !== 'decided' && ending.kind !== 'held') return;
    agenda.add(later(context.clock.now(), this.chance.between(12, 40)), () =>
      this.sign(this.chance.pick(cast.quality), ending.kind === 'held' ? ending.reason : null),
    );
  }

  private async sign(signer: Caller, holdReason: string | null): Promise<void> {
    const verdict = await signLot(this.on.context, signer, this.id, holdReason);
    if (verdict === 'rejected') await this.on.noticesSent();
  }
}
