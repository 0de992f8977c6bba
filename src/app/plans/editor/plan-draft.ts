import { computed, signal } from '@angular/core';
import { type Characteristic, type RevisionBody } from '#shared/contract/plans';
import { type Fault } from '#shared/contract/problem';
import { guardFaults } from '#shared/plan/guard-faults';
import { type SiteInstrument, typicalUncertainties } from '#shared/plan/typical-uncertainty';
import { contentFaults } from './content-faults';
import { sameValue } from './same-value';

/** A characteristic while its plan is edited; `id` stays the same when it is moved or its key changes. */
export interface DraftRow {
  readonly id: number;
  readonly value: Characteristic;
}

/** What belongs to the whole plan. */
export type PlanSettings = Omit<RevisionBody, 'characteristics'>;

const NO_SETTINGS: PlanSettings = {
  level: 'II',
  classAqls: [],
  decisionRule: 'simple',
  coverageFactor: 2,
  warmUpMinutes: null,
  changeNote: '',
};

/** What a revision says of the whole plan, without what it is beside its content. */
function settingsOf({
  level,
  classAqls,
  decisionRule,
  coverageFactor,
  warmUpMinutes,
  changeNote,
}: RevisionBody): PlanSettings {
  return { level, classAqls, decisionRule, coverageFactor, warmUpMinutes, changeNote };
}

/** The content of a plan revision on the screen: shown, or changed and checked as it is typed. */
export class PlanDraft {
  private readonly stored = signal<RevisionBody | null>(null);
  private readonly refused = signal<readonly Fault[]>([]);
  private readonly unreadSettings = signal<readonly Fault[]>([]);
  private readonly unread = signal<ReadonlyMap<number, readonly Fault[]>>(new Map());
  private nextId = 1;

  readonly rows = signal<readonly DraftRow[]>([]);
  readonly settings = signal<PlanSettings>(NO_SETTINGS);
  readonly selectedId = signal<number | null>(null);
  /** Counts the times the content was replaced from outside, so that forms over it start anew. */
  readonly shownTimes = signal(0);

  readonly content = computed<RevisionBody>(() => ({
    ...this.settings(),
    characteristics: this.rows().map((row) => row.value),
  }));
  readonly changed = computed(() => !sameValue(this.content(), this.stored()));
  /** What the rules and the server find wrong, by path. */
  readonly faults = computed(() => [
    ...this.unreadSettings(),
    ...this.unreadFaults(),
    ...contentFaults(this.content()),
    ...this.refused(),
  ]);
  /** What the site measures with; its uncertainties tell what guard bands leave. */
  readonly instruments = signal<readonly SiteInstrument[]>([]);
  /** Guard bands that leave nothing: a draft may be kept with them, and is not sent for approval. */
  readonly guardFaults = computed(() => {
    const content = this.content();
    return guardFaults(content, typicalUncertainties(content, this.instruments()));
  });
  /** Faults that are shown at once, whether or not somebody has been in their field. */
  readonly pressing = computed(() => [...this.refused(), ...this.guardFaults()]);
  readonly selected = computed(() => this.rows().find((row) => row.id === this.selectedId()) ?? null);
  readonly selectedIndex = computed(() => this.rows().findIndex((row) => row.id === this.selectedId()));

  /** Shows a stored revision; keeps the place of the selection. */
  show(body: RevisionBody): void {
    const { characteristics } = body;
    const settings = settingsOf(body);
    const place = Math.max(this.selectedIndex(), 0);
    this.stored.set({ ...settings, characteristics });
    this.settings.set(settings);
    this.rows.set(characteristics.map((value) => ({ id: this.nextId++, value })));
    this.refused.set([]);
    this.unreadSettings.set([]);
    this.unread.set(new Map());
    this.selectedId.set(this.rows()[Math.min(place, characteristics.length - 1)]?.id ?? null);
    this.shownTimes.update((times) => times + 1);
  }

  /** Takes the content as stored by now, without disturbing what is being typed. */
  markStored(body: RevisionBody): void {
    this.stored.set({ ...settingsOf(body), characteristics: body.characteristics });
    this.refused.set([]);
  }

  /** Whether the stored revision holds a characteristic of that key. */
  isStored(key: string): boolean {
    return this.stored()?.characteristics.some((each) => each.key === key) ?? false;
  }

  refuse(faults: readonly Fault[]): void {
    this.refused.set(faults);
  }

  /** Changes what belongs to the whole plan; `unread` names the fields of the change whose text is not understood. */
  changeSettings(change: Partial<PlanSettings>, unread?: readonly Fault[]): void {
    this.refused.set([]);
    if (unread !== undefined) this.unreadSettings.set(unread);
    this.settings.update((settings) => ({ ...settings, ...change }));
  }

  /** Takes a characteristic as its fields describe it; `unread` names the fields whose text is not understood. */
  change(id: number, value: Characteristic, unread: readonly Fault[] = []): void {
    this.refused.set([]);
    this.unread.update((known) => new Map(known).set(id, unread));
    this.rows.update((rows) => rows.map((row) => (row.id === id ? { id, value } : row)));
  }

  add(value: Characteristic): void {
    const id = this.nextId++;
    this.rows.update((rows) => [...rows, { id, value }]);
    this.selectedId.set(id);
  }

  /** Takes a characteristic out; yields what puts it back where it was. */
  remove(id: number): () => void {
    const before = this.rows();
    const index = before.findIndex((row) => row.id === id);
    this.rows.set(before.filter((row) => row.id !== id));
    this.selectedId.set(this.rows()[Math.min(index, before.length - 2)]?.id ?? null);
    return () => {
      const row = before[index];
      if (row === undefined) return;
      this.rows.update((rows) => [...rows.slice(0, index), row, ...rows.slice(index)]);
      this.selectedId.set(id);
    };
  }

  /** Moves a characteristic to another place at the bench, counted from 0; places outside are left alone. */
  move(from: number, to: number): boolean {
    const rows = [...this.rows()];
    if (to < 0 || to >= rows.length) return false;
    const [row] = rows.splice(from, 1);
    if (row === undefined) return false;
    rows.splice(to, 0, row);
    this.refused.set([]);
    this.rows.set(rows);
    return true;
  }

  private unreadFaults(): Fault[] {
    return this.rows().flatMap((row, index) =>
      (this.unread().get(row.id) ?? []).map(({ path, message }) => ({
        path: ['characteristics', index, ...path],
        message,
      })),
    );
  }
}
