import { eventTypes, type EventType } from '@/lib/audit/event-types';
import type { PresentedAuditEvent } from '@/lib/audit/schema';
import { ChangeTable } from './change-table';

function sentence(type: string): string {
  return eventTypes[type as EventType] ?? type;
}

/** Events as a list that can be read from top to bottom: when, who, what, why; details folded. */
export function EventList({ events }: { events: PresentedAuditEvent[] }) {
  return (
    <ol className="divide-y divide-line border-y border-line">
      {events.map((event) => (
        <li key={event.id} className="py-3">
          <p className="flex flex-wrap items-baseline gap-x-3">
            <time dateTime={event.at} className="text-sm text-ink-soft tabular-nums">
              {event.at.slice(0, 19).replace('T', ' ')} UTC
            </time>
            <span className="font-bold">{sentence(event.type)}</span>
            <span className="text-sm text-ink-soft">
              {event.recordType} {event.recordId}
            </span>
          </p>
          <p>
            {event.actorName}
            {event.actorKind === 'token' ? ' (access token)' : null}
            {event.reason ? <span>: “{event.reason}”</span> : null}
          </p>
          <details className="mt-1">
            <summary className="inline-flex min-h-target cursor-pointer items-center text-glass">
              Details
            </summary>
            <ChangeTable before={event.before} after={event.after} />
            <p className="mt-2 text-sm break-all text-ink-soft">
              Event {event.sequence}, hash <span className="font-mono">{event.hash}</span>, after{' '}
              <span className="font-mono">{event.previousHash}</span>
            </p>
          </details>
        </li>
      ))}
    </ol>
  );
}
