/** Four decimals in degrees and dB: far below what the model says, and above the noise of single precision. */
const DECIMALS = 10_000;
/** From here on a count of ten-thousandths is no longer exact. */
const LARGEST = 1e11;
/** Longest text of a number: sign, 17 digits, point, exponent. */
const NUMBER_ROOM = 32;

const [ZERO, MINUS, POINT, COMMA, RETURN, FEED] = Array.from('0-.,\r\n', (sign) => sign.charCodeAt(0));

/**
 * A table written straight into bytes. Of a table of 10^5 cells with 10^6 numbers nearly all the time would else go into
 * collecting the strings that each number and each row leaves behind.
 */
export class TableBytes {
  private bytes: Buffer;
  private length = 0;

  constructor(expectedBytes = 1 << 16) {
    this.bytes = Buffer.allocUnsafe(Math.max(NUMBER_ROOM, expectedBytes));
  }

  /** Bytes of text as they are: guarding and quoting is up to whoever made them. */
  text(bytes: Uint8Array): void {
    this.reserve(bytes.length);
    this.bytes.set(bytes, this.length);
    this.length += bytes.length;
  }

  comma(): void {
    this.sign(COMMA);
  }

  endRow(): void {
    this.sign(RETURN);
    this.sign(FEED);
  }

  /** A whole number of at most fifteen digits, 0 or more. */
  whole(value: number): void {
    this.reserve(NUMBER_ROOM);
    let digits = 1;
    for (let reach = 10; reach <= value; reach *= 10) digits += 1;
    this.digits(value, digits);
  }

  /** What `String(Math.round(value * 1e4) / 1e4)` gives, without a negative zero. */
  decimal(value: number): void {
    requireFinite(value);
    if (Math.abs(value) >= LARGEST) return this.text(Buffer.from(String(value), 'latin1'));
    const count = Math.round(value * DECIMALS);
    const size = Math.abs(count);
    const whole = Math.floor(size / DECIMALS);
    this.reserve(NUMBER_ROOM);
    if (count < 0) this.bytes[this.length++] = MINUS;
    this.whole(whole);
    let part = size - whole * DECIMALS;
    if (part === 0) return;
    let digits = 4;
    for (; part % 10 === 0; digits--) part /= 10;
    this.bytes[this.length++] = POINT;
    this.digits(part, digits);
  }

  /** Six significant digits in shortest decimals. */
  significant(value: number): void {
    requireFinite(value);
    const text = String(Number(value.toPrecision(6)));
    this.reserve(NUMBER_ROOM);
    this.length += this.bytes.write(text, this.length, 'latin1');
  }

  /** What was written so far; nothing may be written after. */
  take(): Buffer {
    return this.bytes.subarray(0, this.length);
  }

  private digits(value: number, count: number): void {
    let left = value;
    for (let at = this.length + count - 1; at >= this.length; at--) {
      const shorter = Math.floor(left / 10);
      this.bytes[at] = ZERO + left - 10 * shorter;
      left = shorter;
    }
    this.length += count;
  }

  private sign(code: number): void {
    this.reserve(1);
    this.bytes[this.length++] = code;
  }

  private reserve(count: number): void {
    if (this.length + count <= this.bytes.length) return;
    const larger = Buffer.allocUnsafe(Math.max(2 * this.bytes.length, this.length + count));
    larger.set(this.bytes.subarray(0, this.length));
    this.bytes = larger;
  }
}

function requireFinite(value: number): void {
  if (!Number.isFinite(value)) throw new RangeError(`A table holds finite numbers; got ${value}`);
}
