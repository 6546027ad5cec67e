'use client';
import useSWR from 'swr';
import { Notice } from '@/components/ui/notice';
import { Skeleton } from '@/components/ui/skeleton';
import type { PlateProfiles } from '@/lib/evidence/tlc/plate-profiles';
import { type ApiError, fetcher } from '@/lib/http/client';
import { profileShape } from './profile-shape';

type LaneProfilesProps = { plateId: string; evidenceId: string; version: number };
type Lane = PlateProfiles['lanes'][number];

const [width, height] = [320, 72];

/** The lane's signal from baseline to front; what belongs to a spot is shaded. */
function ProfilePicture({ lane, most }: { lane: Lane; most: number }) {
  const shape = profileShape(lane, width, height, most);
  return (
    <svg viewBox={`0 0 ${width} ${height + 14}`} aria-hidden="true" className="block w-full max-w-md">
      {shape.areas.map(({ left, right }, index) => (
        <rect
          key={index}
          x={left}
          width={Math.max(1, right - left)}
          y={0}
          height={height}
          className="fill-glass-wash"
        />
      ))}
      <path d={`M0 ${height}H${width}`} className="stroke-line-strong" />
      {[shape.origin, shape.front].map((x) => (
        <path key={x} d={`M${x} 0V${height}`} strokeDasharray="2 3" className="stroke-line-strong" />
      ))}
      <path d={shape.path} fill="none" strokeWidth="1.5" className="stroke-ink" />
      <text x={shape.origin} y={height + 12} fontSize="11" className="fill-ink-soft">
        Rf 0
      </text>
      <text x={shape.front} y={height + 12} fontSize="11" textAnchor="end" className="fill-ink-soft">
        1
      </text>
    </svg>
  );
}

/** Profile of each lane under the photo with the areas of its spots, and what diluted lanes let one say. */
export function LaneProfiles({ plateId, evidenceId, version }: LaneProfilesProps) {
  // The version stands in the key only, so that saved marks are measured anew.
  const { data, error } = useSWR<PlateProfiles, ApiError>(
    [`/api/v1/plates/${plateId}/profiles?photo=${evidenceId}`, version],
    ([path]: [string, number]) => fetcher<PlateProfiles>(path),
    { revalidateOnFocus: false, shouldRetryOnError: false },
  );
  const most = Math.max(0, ...(data?.lanes ?? []).flatMap((lane) => lane.signal));
  return (
    <section aria-labelledby="profiles-heading" className="mt-8">
      <h2 id="profiles-heading" className="mb-2 text-lg">
        Lane profiles
      </h2>
      {error ? <Notice title="No profiles">{error.detail}</Notice> : null}
      {!data && !error ? <Skeleton label="Measuring the lanes" /> : null}
      {data ? (
        <>
          <ul className="grid gap-x-8 gap-y-5 sm:grid-cols-2">
            {data.lanes.map((lane) => (
              <li key={lane.laneId}>
                <h3>Lane {lane.label}</h3>
                {lane.rf.length > 0 ? <ProfilePicture lane={lane} most={most} /> : null}
                <p className="text-sm">
                  {lane.areas.length > 0
                    ? `Areas in this lane: ${lane.areas
                        .map(({ rf, percentOfLane }) => `Rf ${rf.toFixed(2)}: ${percentOfLane.toFixed(0)} %`)
                        .join('; ')}.`
                    : 'No spot is marked in this lane.'}
                </p>
              </li>
            ))}
          </ul>
          {data.estimates.length > 0 ? (
            <ul className="mt-4 list-disc pl-5">
              {data.estimates.map(({ laneId, label, of, words }) => (
                <li key={`${laneId} ${of.kind} ${of.rf}`}>
                  <span className="font-bold">{label}:</span> {words}
                </li>
              ))}
            </ul>
          ) : null}
          <p className="mt-3 max-w-prose text-sm text-ink-soft">{data.limits}</p>
        </>
      ) : null}
    </section>
  );
}
