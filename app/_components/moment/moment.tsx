import { exactMoment, shortDay } from '../register/telling';

const clock = new Intl.DateTimeFormat('en-GB', { timeZone: 'UTC', hour: '2-digit', minute: '2-digit' });

/** A day, with the year where it is another one, and on request the time; the exact moment stands in its tooltip. */
export function Moment({ at, time = false }: { at: Date; time?: boolean }) {
  const iso = at.toISOString();
  return (
    <time dateTime={iso} title={exactMoment(iso)} className="whitespace-nowrap">
      {shortDay(iso)}
      {time && `, ${clock.format(at)}`}
    </time>
  );
}
