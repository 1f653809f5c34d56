/**
 * Samples of one channel while the file is being read: blocks instead of one growing array, so that
 * nothing is copied on the way and a long file needs at most its own size twice, at the very end.
 */
export class GrowingSamples {
  private readonly blocks: (Float64Array | null)[] = [];
  private block: Float64Array;
  private used = 0;
  private fullLength = 0;

  constructor(firstBlockLength: number) {
    this.block = new Float64Array(Math.max(16, firstBlockLength));
  }

  get length(): number {
    return this.fullLength + this.used;
  }

  push(value: number): void {
    if (this.used === this.block.length) this.addBlock();
    this.block[this.used++] = value;
  }

  /** @returns how many samples are neither 0 nor a gap */
  countNonZero(): number {
    let count = 0;
    const add = (block: Float64Array) => {
      for (let i = 0; i < block.length; i += 1) if (Math.abs(block[i]!) > 0) count += 1;
    };
    for (const block of this.blocks) if (block !== null) add(block);
    add(this.block.subarray(0, this.used));
    return count;
  }

  /** @returns all samples in an array of their own; the object can't be used afterwards */
  finish(): Float64Array {
    const samples = new Float64Array(this.length);
    let at = 0;
    for (let i = 0; i < this.blocks.length; i += 1) {
      const block = this.blocks[i]!;
      samples.set(block, at);
      at += block.length;
      this.blocks[i] = null;
    }
    samples.set(this.block.subarray(0, this.used), at);
    return samples;
  }

  private addBlock(): void {
    this.blocks.push(this.block);
    this.fullLength += this.block.length;
    const length = Math.min(blockLengthMax, Math.max(1024, this.fullLength));
    this.block = new Float64Array(length);
    this.used = 0;
  }
}

/** 8 MiB: large enough to be rare, small enough not to matter half empty. */
const blockLengthMax = 1_048_576;
