import type { RowBlock } from "./block.ts";
import { firstPlace, nextStart, startsAcross } from "./starts.ts";
import type { Kind, Pose, Stock, Task } from "./task.ts";

interface Band {
  at: number;
  size: number;
  cells: { at: number; kind: number; pose: Pose }[];
  /** Where the next piece may begin. */
  next: number;
}

/**
 * A board being filled band by band: strips ripped along it ("y") or sections crosscut from it ("x"), pieces one after
 * another in each. A piece goes into the first band that takes it, else into a new one.
 */
export class ShelfBoard {
  private bands: Band[] = [];
  private frontier = 0;

  constructor(
    private readonly task: Task,
    readonly stock: Stock,
    private readonly way: "x" | "y",
  ) {}

  get isEmpty(): boolean {
    return this.bands.length === 0;
  }

  /** Places so many pieces of a kind, all or none. */
  place(kind: Kind, pieces: number): boolean {
    if (!this.stock.eligible[kind.index]) return false;
    if (pieces === 1) return this.placeOne(kind);
    const before = {
      bands: this.bands.map((band) => ({ ...band, cells: band.cells.slice() })),
      frontier: this.frontier,
    };
    for (let placed = 0; placed < pieces; placed++)
      if (!this.placeOne(kind)) {
        this.bands = before.bands;
        this.frontier = before.frontier;
        return false;
      }
    return true;
  }

  block(): RowBlock {
    const { way } = this;
    const along = way === "y" ? "length" : "width";
    return {
      way,
      cells: this.bands.map(({ at, size, cells }) => ({
        at,
        size,
        block: {
          way: way === "y" ? "x" : "y",
          cells: cells.map(({ at, kind, pose }) => ({ at, size: pose[along], block: { kind, pose } })),
        },
      })),
    };
  }

  private placeOne(kind: Kind): boolean {
    for (const pose of kind.poses) {
      const bandSize = this.way === "y" ? pose.width : pose.length;
      for (const band of this.bands) if (bandSize <= band.size && this.intoBand(kind, pose, band)) return true;
    }
    return kind.poses.some((pose) => this.newBand(kind, pose));
  }

  private intoBand(kind: Kind, pose: Pose, band: Band): boolean {
    const at =
      this.way === "y"
        ? firstPlace(this.stock, kind, pose, band.next, band.at, "x")
        : firstPlace(this.stock, kind, pose, band.at, band.next, "y");
    if (!Number.isFinite(at)) return false;
    band.cells.push({ at, kind: kind.index, pose });
    band.next = at + (this.way === "y" ? pose.length : pose.width) + this.task.kerf;
    return true;
  }

  private newBand(kind: Kind, pose: Pose): boolean {
    const { stock, way, frontier } = this;
    const size = way === "y" ? pose.width : pose.length;
    const starts =
      way === "y"
        ? [nextStart(startsAcross(stock, kind, pose), frontier), firstPlace(stock, kind, pose, 0, frontier, "y")]
        : [frontier, firstPlace(stock, kind, pose, frontier, 0, "x")];
    for (const at of starts) {
      if (!Number.isFinite(at)) continue;
      const band: Band = { at, size, cells: [], next: 0 };
      if (!this.intoBand(kind, pose, band)) continue;
      this.bands.push(band);
      this.frontier = at + size + this.task.kerf;
      return true;
    }
    return false;
  }
}
