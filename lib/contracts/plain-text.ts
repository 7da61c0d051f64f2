import { z } from 'zod';

/** What is no text: controls, halves of characters, other ends of line, and what turns the direction of what follows. */
export const hidden = /[\p{Cc}\p{Cs}\u2028\u2029\u202a-\u202e\u2066-\u2069]/u;
/** The same, but for the end of a line and the tab. */
const hiddenInLines = /[^\P{Cc}\n\t]|[\p{Cs}\u2028\u2029\u202a-\u202e\u2066-\u2069]/u;

/** A text of one line, without blanks around it and without control characters. */
export const oneLine = (longest: number) =>
  z
    .string()
    .trim()
    .min(1)
    .max(longest)
    .refine((text) => !hidden.test(text), {
      error: 'This is one line of text: no line breaks, no control characters.',
    });

/** A text that may have several lines, without blanks around it and without other control characters. */
export const lines = (longest: number) =>
  z
    .string()
    .trim()
    .overwrite((text) => text.replace(/\r\n?/g, '\n'))
    .min(1)
    .max(longest)
    .refine((text) => !hiddenInLines.test(text), {
      error: 'This is plain text: no control characters but line breaks and tabs.',
    });
