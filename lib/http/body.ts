import { type Problem, problemOf } from '@/lib/contracts/problem';

/** Bytes a body may have. */
export const largestBody = 1024 * 1024;

export type BodyRead = { readonly body: Record<string, unknown> } | { readonly problem: Problem };

/**
 * Reads the body of a request as one JSON object. It is measured while it is read, so that neither a missing nor a false
 * Content-Length lets more in.
 */
export async function readBody(request: Request): Promise<BodyRead> {
  if (!isJson(request.headers.get('content-type')))
    return { problem: problemOf('content-type', 'Send the body with Content-Type: application/json.') };
  if (request.headers.has('content-encoding') && request.headers.get('content-encoding') !== 'identity')
    return { problem: problemOf('content-type', 'Send the body without Content-Encoding.') };
  if (Number(request.headers.get('content-length') ?? 0) > largestBody) return { problem: tooLarge() };
  const bytes = await readBytes(request.body);
  if (bytes === undefined) return { problem: tooLarge() };
  try {
    const value: unknown = JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(bytes));
    if (isObject(value)) return { body: value };
    return { problem: problemOf('unreadable-json', 'The body must be a JSON object, not another kind of JSON value.') };
  } catch {
    return { problem: problemOf('unreadable-json', 'The body is not JSON in UTF-8.') };
  }
}

const tooLarge = (): Problem => problemOf('too-large', 'The body has more than 1 MiB (1 048 576 bytes).');

const isObject = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

function isJson(type: string | null): boolean {
  const [media, ...parameters] = (type ?? '').toLowerCase().split(';');
  if (media?.trim() !== 'application/json') return false;
  return parameters.every((parameter) => {
    const [name, value] = parameter.split('=');
    return name?.trim() !== 'charset' || /^"?utf-?8"?$/.test(value?.trim() ?? '');
  });
}

/** Undefined when there are more than the limit; then the rest is not read. */
async function readBytes(stream: ReadableStream<Uint8Array> | null): Promise<Uint8Array | undefined> {
  if (stream === null) return new Uint8Array();
  const chunks: Uint8Array[] = [];
  let length = 0;
  const reader = stream.getReader();
  for (let chunk = await reader.read(); !chunk.done; chunk = await reader.read()) {
    length += chunk.value.byteLength;
    if (length > largestBody) {
      await reader.cancel();
      return undefined;
    }
    chunks.push(chunk.value);
  }
  return Buffer.concat(chunks, length);
}
