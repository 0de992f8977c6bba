/** A cell of the measuring grid: the unit in draw order, from 1, and the column, from 0. */
export interface GridPlace {
  readonly unit: number;
  readonly column: number;
}

/** A column of the grid, as far as walking needs it. */
export interface WalkColumn {
  /** Whether readings are typed here; a computed column is only looked at. */
  readonly typed: boolean;
  /** Readings are asked of units 1 to this one. */
  readonly requiredTo: number;
}

/** Whether one unit is measured completely before the next, or one characteristic on all units. */
export const WALK_ORDERS = ['by-characteristic', 'by-unit'] as const;
/** One of {@link WALK_ORDERS}. */
export type WalkOrder = (typeof WALK_ORDERS)[number];

/** A move of the focus that ignores what is measured and what is not. */
export type GridMove =
  'up' | 'down' | 'left' | 'right' | 'row-start' | 'row-end' | 'first' | 'last' | 'page-up' | 'page-down';

/** Units a page key moves over. */
const PAGE = 10;

/** Whether a reading is still missing at a place. */
export type IsOpen = (place: GridPlace) => boolean;

/** Where the focus of the measuring grid goes. Knows places only, nothing of a screen. */
export class GridWalk {
  /** @throws {RangeError} for a grid without a unit or without a column */
  constructor(
    private readonly units: number,
    private readonly columns: readonly WalkColumn[],
  ) {
    if (units < 1 || columns.length < 1) throw new RangeError('units and columns must each hold at least one.');
  }

  /** Arrow keys, Home and End, page keys: one step, stopping at the edges. */
  move({ unit, column }: GridPlace, move: GridMove): GridPlace {
    const right = this.columns.length - 1;
    const moves: Record<GridMove, GridPlace> = {
      up: { unit: unit - 1, column },
      down: { unit: unit + 1, column },
      left: { unit, column: column - 1 },
      right: { unit, column: column + 1 },
      'row-start': { unit, column: 0 },
      'row-end': { unit, column: right },
      first: { unit: 1, column: 0 },
      last: { unit: this.units, column: right },
      'page-up': { unit: unit - PAGE, column },
      'page-down': { unit: unit + PAGE, column },
    };
    return this.inside(moves[move]);
  }

  /** The next place to be typed, at the row's end the next unit's first; null behind the last. */
  next(place: GridPlace): GridPlace | null {
    return this.inRow(place.unit, place.column + 1) ?? this.firstFrom(place.unit + 1);
  }

  /** The place to be typed before this one, at the row's start the last of the unit before; null before the first. */
  previous({ unit, column }: GridPlace): GridPlace | null {
    for (let row = unit; row >= 1; row -= 1) {
      const before = row === unit ? column : this.columns.length;
      const found = this.columns.findLastIndex(
        (_, index) => index < before && this.asked({ unit: row, column: index }),
      );
      if (found >= 0) return { unit: row, column: found };
    }
    return null;
  }

  /**
   * Where the focus goes once a reading is kept: down the column or along the row, as the order says. At the end of the
   * column or of the last row it goes to the first place that is still open, and stays where nothing is.
   */
  afterKeeping(place: GridPlace, order: WalkOrder, isOpen: IsOpen): GridPlace {
    const step = order === 'by-unit' ? this.next(place) : { unit: place.unit + 1, column: place.column };
    if (step !== null && step.unit <= this.units && this.asked(step)) return step;
    return this.firstOpen(order, isOpen) ?? place;
  }

  /** The first place still open in the order of measuring; null where nothing is. */
  firstOpen(order: WalkOrder, isOpen: IsOpen): GridPlace | null {
    return this.inOrder(order).find((place) => this.asked(place) && isOpen(place)) ?? null;
  }

  private inOrder(order: WalkOrder): GridPlace[] {
    const units = Array.from({ length: this.units }, (_, index) => index + 1);
    const columns = [...this.columns.keys()];
    return order === 'by-unit'
      ? units.flatMap((unit) => columns.map((column) => ({ unit, column })))
      : columns.flatMap((column) => units.map((unit) => ({ unit, column })));
  }

  private inRow(unit: number, from: number): GridPlace | null {
    const found = this.columns.findIndex((_, column) => column >= from && this.asked({ unit, column }));
    return found < 0 ? null : { unit, column: found };
  }

  private firstFrom(unit: number): GridPlace | null {
    for (let row = unit; row <= this.units; row += 1) {
      const found = this.inRow(row, 0);
      if (found !== null) return found;
    }
    return null;
  }

  private asked({ unit, column }: GridPlace): boolean {
    const at = this.columns[column];
    return at !== undefined && at.typed && unit <= at.requiredTo;
  }

  private inside({ unit, column }: GridPlace): GridPlace {
    return {
      unit: Math.min(Math.max(unit, 1), this.units),
      column: Math.min(Math.max(column, 0), this.columns.length - 1),
    };
  }
}
