import { Readable } from 'node:stream';

interface File {
  readonly type: string;
  readonly name: string;
  readonly chunks: AsyncIterable<string>;
}

async function* bytesOf(chunks: AsyncIterable<string>): AsyncIterable<Uint8Array> {
  const encoder = new TextEncoder();
  for await (const chunk of chunks) yield encoder.encode(chunk);
}

/** A file that a browser keeps instead of showing it; it is sent while it is written. */
export const fileResponse = ({ type, name, chunks }: File): Response =>
  new Response(Readable.toWeb(Readable.from(bytesOf(chunks))) as ReadableStream<Uint8Array>, {
    headers: {
      'Content-Type': type,
      'Content-Disposition': `attachment; filename="${name}"`,
      'Cache-Control': 'no-store',
      'X-Content-Type-Options': 'nosniff',
    },
  });
