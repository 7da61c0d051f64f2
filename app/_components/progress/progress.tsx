'use client';

import { useEffect, useState } from 'react';
import { Button } from '../button/button';

interface Props {
  /** 0 to 1. */
  part: number;
  /** What is being done: "Checking the file". */
  doing: string;
  /** "7 of 12". */
  figure: string;
  onStop?: () => void;
}

const stones = 24;
const nothingBefore = 400;

/** Long work as a course of 24 stones with its figure; under 400 ms nothing is shown. */
export function Progress({ part, doing, figure, onStop }: Props) {
  const [due, setDue] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setDue(true), nothingBefore);
    return () => clearTimeout(timer);
  }, []);
  if (!due) return null;
  const laid = Math.round(Math.min(1, Math.max(0, part)) * stones);
  return (
    <div>
      <div
        className="bar"
        role="progressbar"
        aria-label={doing}
        aria-valuemin={0}
        aria-valuemax={stones}
        aria-valuenow={laid}
        aria-valuetext={figure}
      >
        {Array.from({ length: stones }, (_, index) => (
          <i key={index} className={index < laid ? 'on' : undefined} />
        ))}
      </div>
      <p className="hint">
        {doing}: {figure}.{' '}
        {onStop && (
          <Button kind="plain" keyName="S" tip="Stop" onClick={onStop}>
            Stop
          </Button>
        )}
      </p>
    </div>
  );
}
