/**
 * Counts over ranks 0 … size − 1 with "which rank holds the k-th smallest so far" in log time (Fenwick 1994): the
 * back-test asks it once per rebuild, and sorting each time over would take hours in place of milliseconds.
 */
export class RankTree {
  private readonly counts: Int32Array;
  private readonly top: number;

  constructor(size: number) {
    this.counts = new Int32Array(size + 1);
    this.top = 2 ** Math.floor(Math.log2(Math.max(1, size)));
  }

  add(rank: number): void {
    for (let i = rank + 1; i < this.counts.length; i += i & -i) this.counts[i] = (this.counts[i] ?? 0) + 1;
  }

  /** Rank of the k-th smallest added so far, k from 1 to the number added. */
  kth(k: number): number {
    let rank = 0;
    let left = k;
    for (let step = this.top; step > 0; step >>= 1) {
      const count = this.counts[rank + step];
      if (count !== undefined && count < left) {
        rank += step;
        left -= count;
      }
    }
    return rank;
  }
}
