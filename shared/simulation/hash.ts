/** Running hash over the bits of double numbers: two multiplicative 32-bit lanes. Equal numbers in equal order give equal
 *  hashes in every host. */
export class BitHash {
  private a = 0x811c9dc5 | 0;
  private b = 0x2f0b4c47 | 0;
  private readonly number = new Float64Array(1);
  private readonly bits = new DataView(this.number.buffer);

  add(value: number): void {
    // DataView with a stated byte order: the same on every machine. −0 counts as 0.
    this.bits.setFloat64(0, value === 0 ? 0 : value, true);
    const low = this.bits.getInt32(0, true);
    const high = this.bits.getInt32(4, true);
    this.a = Math.imul(this.a ^ low, 0x01000193) ^ high;
    this.b = (Math.imul(this.b, 31) + low) ^ Math.imul(high, 0x27d4eb2d);
    this.a = Math.imul(this.a, 0x85ebca6b) ^ (this.a >>> 15);
    this.b = Math.imul(this.b, 0xc2b2ae35 | 0) ^ (this.b >>> 13);
  }

  /** Adds the first `count` values. */
  addAll(values: Float64Array, count: number): void {
    for (let i = 0; i < count; i++) this.add(values[i]!);
  }

  /** Sixteen hexadecimal digits. */
  text(): string {
    const hex = (lane: number): string => (lane >>> 0).toString(16).padStart(8, '0');
    return hex(this.a) + hex(this.b);
  }
}
