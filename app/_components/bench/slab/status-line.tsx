import { useEffect, useState } from 'react';
import { Button } from '../../button/button';
import { Progress } from '../../progress/progress';
import type { Fault } from '../fault';
import type { Reading } from '../reading';
import type { Asked } from '../use-answer';

interface Props {
  readonly id: string;
  readonly reading: Reading | undefined;
  readonly fault: Fault | undefined;
  readonly asked: Asked;
}

/** The interactive budget of the service, which the course of stones is measured against, in seconds. */
const budget = 2;

function milliseconds(ms: number): string {
  return ms < 1000 ? `${Math.round(ms)} ms` : `${(ms / 1000).toFixed(1)} s`;
}

function Working({ onStop }: { readonly onStop: () => void }) {
  const [spent, setSpent] = useState(0);
  useEffect(() => {
    const begin = performance.now();
    const timer = setInterval(() => setSpent((performance.now() - begin) / 1000), 200);
    return () => clearInterval(timer);
  }, []);
  return (
    <div className="reading-work">
      <Progress
        part={Math.min(1, spent / budget)}
        doing="Working it out"
        figure={`${spent.toFixed(1)} of ${budget} seconds`}
        onStop={onStop}
      />
    </div>
  );
}

function words({ reading, fault, asked }: Props): string {
  if (!reading) return 'A long text is read when the hand rests.';
  if (reading.state === 'empty') return 'Nothing is written yet.';
  if (reading.state === 'unread') return fault?.readTo ?? 'Not read to the end.';
  if (asked.offline) return 'Read to the end. The connection is down; it is asked when the connection is back.';
  if (asked.stopped) return 'Read to the end. Stopped before an answer came.';
  if (asked.declined) return fault ? 'Read to the end. It could not be answered.' : asked.declined.message;
  if (asked.current && asked.took === undefined) return 'Read to the end. Answered.';
  if (asked.current && asked.took !== undefined)
    return `Read to the end. Answered ${milliseconds(asked.took)} after the last key.`;
  return 'Read to the end.';
}

/** What became of the line: how far it was read, how long the answer took, work that can be stopped. */
export function StatusLine(props: Props) {
  const { id, asked, fault } = props;
  const again = asked.stopped || (asked.declined && !fault);
  return (
    <div className="reading-status">
      {asked.working && <Working onStop={asked.stop} />}
      <p className={asked.slow ? 'sr' : 'small quiet'} id={id}>
        {words(props)}
      </p>
      {again && (
        <Button kind="plain" onClick={asked.askNow}>
          Ask again
        </Button>
      )}
    </div>
  );
}
