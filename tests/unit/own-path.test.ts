import { describe, expect, test } from 'vitest';
import { ownPath } from '@/lib/people/own-path';

describe('where one goes on to after signing in', () => {
  test.each([
    ['/register', '/register'],
    ['/identities/skerry-6/2?x=1#cite', '/identities/skerry-6/2?x=1#cite'],
    ['/', '/'],
    ['/register?q=%2F%2Felsewhere.example', '/register?q=%2F%2Felsewhere.example'],
    ['/a/../register', '/register'],
  ])('%j is a path of one’s own', (text, path) => {
    expect(ownPath(text)).toBe(path);
  });

  test.each([
    'https://elsewhere.example/',
    '//elsewhere.example',
    '///elsewhere.example',
    '/\\elsewhere.example',
    '\\\\elsewhere.example',
    '/\t/elsewhere.example',
    '/\n/elsewhere.example',
    '\t//elsewhere.example',
    ' //elsewhere.example',
    '/..//elsewhere.example',
    '/.//elsewhere.example',
    '/%2e%2e//elsewhere.example',
    '/register\\..\\..\\x',
    'javascript:alert(1)',
    'register',
    '',
    `/${'a'.repeat(3000)}`,
    undefined,
    ['/register', '/bench'],
    null,
  ])('%j is not', (text) => {
    expect(ownPath(text)).toBeUndefined();
  });

  test('what is let through stays on the origin, however a browser reads it', () => {
    const pieces = ['/', '\\', '.', '..', '%2f', '%5c', '@', ':', 'x.example', '?', '#', '\t', ' ', 'http:'];
    for (const a of pieces)
      for (const b of pieces)
        for (const c of pieces) {
          const path = ownPath(`/${a}${b}${c}`);
          if (path !== undefined) expect(new URL(path, 'http://here.example').origin).toBe('http://here.example');
        }
  });
});
