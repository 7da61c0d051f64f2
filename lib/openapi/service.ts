import type { z } from 'zod';
import type { openApiAnswer } from '@/lib/contracts/openapi';
import { openApiDocument } from './document';

// The document changes only with the program, so it is made once.
let made: z.infer<typeof openApiAnswer> | undefined;

/** The OpenAPI document as plain data. */
export function describeApi(): z.infer<typeof openApiAnswer> {
  made ??= JSON.parse(JSON.stringify(openApiDocument())) as z.infer<typeof openApiAnswer>;
  return made;
}
