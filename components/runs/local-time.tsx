'use client';
import { useSyncExternalStore } from 'react';

const never = () => () => undefined;
const pad = (part: number) => String(part).padStart(2, '0');

/** `2026-11-02 09:30` in the reader's own time zone; the server, which cannot know it, writes UTC. */
export function LocalTime({ at, dateOnly = false }: { at: string; dateOnly?: boolean }) {
  const inBrowser = useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
  const utc = `${at.slice(0, 10)}${dateOnly ? '' : ` ${at.slice(11, 16)} UTC`}`;
  if (!inBrowser) return <time dateTime={at}>{utc}</time>;
  const time = new Date(at);
  const day = `${time.getFullYear()}-${pad(time.getMonth() + 1)}-${pad(time.getDate())}`;
  return (
    <time dateTime={at} title={`${at.slice(0, 10)} ${at.slice(11, 19)} UTC`} className="whitespace-nowrap">
      {dateOnly ? day : `${day} ${pad(time.getHours())}:${pad(time.getMinutes())}`}
    </time>
  );
}
