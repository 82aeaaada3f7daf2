import { invertInto } from "./dense-inverse.ts";

/** A column of the master program: what it covers, row by row, and what it costs. */
export interface Column {
  rows: number[];
  values: number[];
  cost: number;
}

/** A basis of a master program with its inverse. */
export interface SavedBasis {
  basis: Int32Array;
  inverse: Float64Array;
}

const PRICE_SLACK = 1e-9;
const PIVOT_SLACK = 1e-9;
const PIVOTS_BETWEEN_REFRESH = 100;
const PIVOTS_BETWEEN_INVERSIONS = 1000;

/**
 * The linear program over cutting patterns: least cost with every demand row covered and every limit row kept, by the
 * revised simplex method on a dense inverse. Columns may be added and demands changed between solves; each solve goes on
 * from the last basis.
 */
export class MasterProgram {
  readonly columns: Column[] = [];
  /** Prices of the rows after a solve: of a demand at least 0, of a limit at most 0. */
  readonly duals: Float64Array;
  value = 0;
  private readonly size: number;
  private readonly rights: Float64Array;
  private readonly inverse: Float64Array;
  private readonly basics: Float64Array;
  /** Column in the basis at each place; −1 − row for the row's artificial, −1 − size − row for its slack or surplus. */
  private readonly basis: Int32Array;
  private readonly direction: Float64Array;
  /** Columns kept out: they may not enter, and cost this much more while they are still in. */
  private blocked: Uint8Array<ArrayBuffer> = new Uint8Array(257);
  private pivots = 0;
  /** The columns once more, one after another in flat arrays: they are gone through at every step. */
  private readonly flat = { starts: new Int32Array(257), rows: new Int32Array(2048), values: new Float64Array(2048) };

  /**
   * @param demands least sum of each of the first rows.
   * @param limits greatest sum of each row after these.
   * @param missing cost of leaving a unit of a demand uncovered; must be high.
   */
  constructor(
    private readonly demands: number[],
    private readonly limits: number[],
    private readonly missing: number[],
  ) {
    this.size = demands.length + limits.length;
    this.rights = new Float64Array(this.size);
    this.inverse = new Float64Array(this.size * this.size);
    this.basis = new Int32Array(this.size);
    this.duals = new Float64Array(this.size);
    this.direction = new Float64Array(this.size);
    this.setRights(demands);
    this.basics = new Float64Array(this.size);
    this.begin();
  }

  add(column: Column): void {
    const { flat } = this;
    const index = this.columns.push(column) - 1;
    const start = flat.starts[index]!;
    const end = start + column.rows.length;
    if (index + 2 > flat.starts.length) {
      flat.starts = longer(flat.starts);
      this.blocked = longer(this.blocked);
    }
    while (end > flat.rows.length) {
      flat.rows = longer(flat.rows);
      flat.values = longer(flat.values);
    }
    flat.rows.set(column.rows, start);
    flat.values.set(column.values, start);
    flat.starts[index + 1] = end;
  }

  /** Lowers the cost until no column helps, or work runs out. */
  solve(mayGoOn: () => boolean = () => true): void {
    for (let step = 0; ; step++) {
      if (step % 64 === 63 && !mayGoOn()) break;
      const entering = this.price();
      if (entering === null || !this.enter(entering)) break;
    }
    this.value = 0;
    for (let row = 0; row < this.size; row++) this.value += this.costOf(this.basis[row]!) * this.basics[row]!;
  }

  /** Changes what has to be covered and which columns may be used; solve goes on from there. */
  change(demands: ArrayLike<number>, isBlocked: (column: Column) => boolean): void {
    this.setRights(demands);
    for (let index = 0; index < this.columns.length; index++)
      this.blocked[index] = isBlocked(this.columns[index]!) ? 1 : 0;
    this.refresh();
    for (let step = 0; step <= this.size; step++) if (!this.leaveNegative()) break;
    if (this.basics.some((amount) => amount < -1e-9)) this.begin();
    for (let row = 0; row < this.size; row++) if (this.basics[row]! < 0) this.basics[row] = 0;
  }

  /** Starts with every demand uncovered and every limit unused. */
  private begin(): void {
    const { size, demands } = this;
    this.inverse.fill(0);
    this.basics.set(this.rights);
    this.duals.fill(0);
    for (let row = 0; row < size; row++) {
      this.inverse[row * size + row] = 1;
      this.basis[row] = row < demands.length ? -1 - row : -1 - size - row;
      if (row < demands.length) this.duals[row] = this.missing[row]!;
    }
  }

  /** The basis as it is, to come back to. */
  save(): SavedBasis {
    return { basis: this.basis.slice(), inverse: this.inverse.slice() };
  }

  /** Goes back to a saved basis; `change` has to follow. */
  restore({ basis, inverse }: SavedBasis): void {
    this.basis.set(basis);
    this.inverse.set(inverse);
  }

  reducedCost(column: Column): number {
    let cost = column.cost;
    const { rows, values } = column;
    for (let i = 0; i < rows.length; i++) cost -= this.duals[rows[i]!]! * values[i]!;
    return cost;
  }

  /** Columns in use, with how much of each. */
  solution(): { column: number; amount: number }[] {
    const found: { column: number; amount: number }[] = [];
    for (let row = 0; row < this.size; row++)
      if (this.basis[row]! >= 0 && this.basics[row]! > 1e-5)
        found.push({ column: this.basis[row]!, amount: this.basics[row]! });
    return found;
  }

  /** Sum of a column's values times the entries of an array at its rows. */
  private dot(index: number, array: Float64Array, base: number): number {
    const { starts, rows, values } = this.flat;
    let sum = 0;
    for (let i = starts[index]!, end = starts[index + 1]!; i < end; i++) sum += array[base + rows[i]!]! * values[i]!;
    return sum;
  }

  private costOf(column: number): number {
    if (column >= 0) return this.columns[column]!.cost * (this.blocked[column] ? BLOCKED_COST : 1);
    return column >= -this.size ? this.missing[-1 - column]! : 0;
  }

  /** Right sides nudged apart, so that the many ties of such programs do not make it go round in circles. */
  private setRights(demands: ArrayLike<number>): void {
    for (let row = 0; row < this.demands.length; row++)
      this.rights[row] = demands[row]! + 1e-7 * (1 + ((row * 7919) % 1009) / 1009);
    this.limits.forEach((limit, i) => {
      this.rights[this.demands.length + i] = limit + 1e-7 * (1 + ((i * 6007) % 911) / 911);
    });
  }

  private price(): number | null {
    let best = -PRICE_SLACK;
    let entering: number | null = null;
    for (let index = 0; index < this.columns.length; index++) {
      if (this.blocked[index]) continue;
      const cost = this.columns[index]!.cost - this.dot(index, this.duals, 0);
      if (cost < best) {
        best = cost;
        entering = index;
      }
    }
    for (let row = 0; row < this.size; row++) {
      const cost = row < this.demands.length ? this.duals[row]! : -this.duals[row]!;
      if (cost < best) {
        best = cost;
        entering = -1 - this.size - row;
      }
    }
    return entering;
  }

  private enter(entering: number): boolean {
    const reduced = this.setDirection(entering);
    const leaving = this.leavingRow();
    if (leaving < 0) return false;
    this.exchange(entering, leaving, reduced, true);
    return true;
  }

  /** Effect of a column on the basics; returns its reduced cost. */
  private setDirection(entering: number): number {
    const { size, inverse, direction } = this;
    if (entering >= 0) {
      const { rows, values } = this.columns[entering]!;
      for (let i = 0; i < size; i++) {
        let sum = 0;
        const base = i * size;
        for (let j = 0; j < rows.length; j++) sum += inverse[base + rows[j]!]! * values[j]!;
        direction[i] = sum;
      }
      return this.reducedCost(this.columns[entering]!);
    }
    const row = -1 - size - entering;
    const sign = row < this.demands.length ? -1 : 1;
    for (let i = 0; i < size; i++) direction[i] = sign * inverse[i * size + row]!;
    return -sign * this.duals[row]!;
  }

  private exchange(entering: number, leaving: number, reduced: number, keepPositive: boolean): void {
    const { size, inverse, basics, direction, duals } = this;
    const pivot = direction[leaving]!;
    const base = leaving * size;
    for (let j = 0; j < size; j++) inverse[base + j]! /= pivot;
    const amount = basics[leaving]! / pivot;
    for (let i = 0; i < size; i++) {
      const factor = direction[i]!;
      if (i === leaving || factor === 0) continue;
      const row = i * size;
      for (let j = 0; j < size; j++) inverse[row + j]! -= factor * inverse[base + j]!;
      basics[i]! -= factor * amount;
      if (keepPositive && basics[i]! < 0) basics[i] = 0;
    }
    basics[leaving] = amount;
    for (let j = 0; j < size; j++) duals[j]! += reduced * inverse[base + j]!;
    this.basis[leaving] = entering;
    this.pivots++;
    if (this.pivots % PIVOTS_BETWEEN_INVERSIONS === 0) this.invert();
    if (this.pivots % PIVOTS_BETWEEN_REFRESH === 0) {
      this.refresh();
      if (keepPositive) for (let i = 0; i < size; i++) if (basics[i]! < 0) basics[i] = 0;
    }
  }

  private leavingRow(): number {
    let leaving = -1;
    let least = Number.POSITIVE_INFINITY;
    for (let i = 0; i < this.size; i++) {
      if (this.direction[i]! <= PIVOT_SLACK) continue;
      const ratio = this.basics[i]! / this.direction[i]!;
      if (ratio < least - 1e-12 || (ratio < least + 1e-12 && this.direction[i]! > this.direction[leaving]!)) {
        least = ratio;
        leaving = i;
      }
    }
    return leaving;
  }

  /** A step of the dual method: takes out the most negative basic, for the column that costs least to bring in. */
  private leaveNegative(): boolean {
    const { size, inverse, basics } = this;
    let leaving = -1;
    let least = -1e-9;
    for (let i = 0; i < size; i++)
      if (basics[i]! < least) {
        least = basics[i]!;
        leaving = i;
      }
    if (leaving < 0) return false;
    const base = leaving * size;
    let entering: number | null = null;
    let ratio = Number.POSITIVE_INFINITY;
    let steepest = 0;
    const consider = (candidate: number, along: number, reduced: number) => {
      const other = Math.max(0, reduced) / -along;
      if (other < ratio - 1e-12 || (other < ratio + 1e-12 && along < steepest)) {
        ratio = other;
        steepest = along;
        entering = candidate;
      }
    };
    for (let index = 0; index < this.columns.length; index++) {
      if (this.blocked[index]) continue;
      const along = this.dot(index, inverse, base);
      if (along < -1e-7) consider(index, along, this.columns[index]!.cost - this.dot(index, this.duals, 0));
    }
    for (let row = 0; row < size; row++) {
      const sign = row < this.demands.length ? -1 : 1;
      const along = sign * inverse[base + row]!;
      if (along < -1e-7) consider(-1 - size - row, along, -sign * this.duals[row]!);
    }
    if (entering === null) return false;
    this.exchange(entering, leaving, this.setDirection(entering), false);
    return true;
  }

  /** Takes the basic amounts and duals anew from the inverse, before rounding piles up. */
  private refresh(): void {
    const { size, inverse } = this;
    this.duals.fill(0);
    for (let i = 0; i < size; i++) {
      const cost = this.costOf(this.basis[i]!);
      let sum = 0;
      for (let j = 0; j < size; j++) {
        sum += inverse[i * size + j]! * this.rights[j]!;
        this.duals[j]! += cost * inverse[i * size + j]!;
      }
      this.basics[i] = sum;
    }
  }

  private invert(): void {
    const { size } = this;
    const matrix = new Float64Array(size * size);
    for (let place = 0; place < size; place++) {
      const column = this.basis[place]!;
      if (column >= 0) {
        const { rows, values } = this.columns[column]!;
        for (let j = 0; j < rows.length; j++) matrix[rows[j]! * size + place] = values[j]!;
      } else if (column >= -size) matrix[(-1 - column) * size + place] = 1;
      else {
        const row = -1 - size - column;
        matrix[row * size + place] = row < this.demands.length ? -1 : 1;
      }
    }
    invertInto(matrix, size, this.inverse);
  }
}

const BLOCKED_COST = 4;

function longer<T extends Int32Array | Float64Array | Uint8Array>(array: T): T {
  const made = new (array.constructor as new (length: number) => T)(2 * array.length);
  made.set(array);
  return made;
}
