'use client';

import { useEffect } from 'react';
import { Course } from '../button/course';
import { stored, useStored } from './stored';

const theme = stored('quadrel.theme', ['system', 'light', 'dark'], 'system');

const options = [
  { value: 'system', label: 'system' },
  { value: 'light', label: 'light' },
  { value: 'dark', label: 'dark' },
] as const;

/** What the script in the head did before the first paint, done again when the choice changes, here or in another tab. */
function apply() {
  const chosen = theme.read();
  if (chosen === 'system') delete document.documentElement.dataset.theme;
  else document.documentElement.dataset.theme = chosen;
}

/** System, light or dark, kept in this browser. */
export function ThemeChoice({ small = false }: { small?: boolean }) {
  const chosen = useStored(theme);
  useEffect(() => theme.subscribe(apply), []);
  return <Course label="Theme" options={options} value={chosen} onChange={theme.write} small={small} />;
}
