/** A file that is written while it is sent. */
export interface SentFile {
  /** Its media type. */
  readonly type: string;
  /** The name under which a browser keeps it: letters, digits, hyphens and a point. */
  readonly name: string;
  readonly chunks: AsyncIterable<string>;
}

/** Text as a stream of bytes that is made no faster than it is read, and no longer once nobody reads it. */
export function byteStream(chunks: AsyncIterable<string>): ReadableStream<Uint8Array> {
  const source = chunks[Symbol.asyncIterator]();
  const encoder = new TextEncoder();
  return new ReadableStream<Uint8Array>({
    async pull(controller) {
      const { done, value } = await source.next();
      if (done === true) controller.close();
      else controller.enqueue(encoder.encode(value));
    },
    async cancel() {
      await source.return?.();
    },
  });
}
