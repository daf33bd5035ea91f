/**
 * Lines of a byte stream as they come, without ever holding more than one.
 * @param mostBytes a longer line is dropped and given as null
 */
export async function* linesOf(input: AsyncIterable<Buffer | string>, mostBytes: number): AsyncGenerator<string | null> {
  let parts: Buffer[] = [];
  let held = 0;
  let isTooLong = false;
  const take = (): string | null => {
    const line = isTooLong ? null : Buffer.concat(parts).toString('utf8');
    parts = [];
    held = 0;
    isTooLong = false;
    return line;
  };
  const keep = (part: Buffer): void => {
    held += part.length;
    if (held > mostBytes) {
      isTooLong = true;
      parts = [];
    } else if (part.length > 0) parts.push(part);
  };
  for await (const piece of input) {
    let chunk = typeof piece === 'string' ? Buffer.from(piece) : piece;
    for (let end = chunk.indexOf(10); end >= 0; end = chunk.indexOf(10)) {
      keep(chunk.subarray(0, end));
      yield take();
      chunk = chunk.subarray(end + 1);
    }
    keep(chunk);
  }
  if (held > 0) yield take();
}
