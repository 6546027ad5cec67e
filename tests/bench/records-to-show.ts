import { drawPlatePhoto } from '../factories/plate-photo';
import type { Laboratory } from './laboratory';
import { sendBytes } from './send-bytes';
import { buildTraceBytes } from './trace-bytes';

type Caller = { url: string; cookie: string };
type WithId = { id: string };

async function send(caller: Caller, path: string, bytes: Buffer, headers: Record<string, string>) {
  const all = { cookie: caller.cookie, origin: caller.url, ...headers };
  return JSON.parse(
    await sendBytes(`${caller.url}${path}`, bytes, { method: 'POST', headers: all }),
  ) as unknown;
}

async function sendFile(caller: Caller, code: string, fileName: string, bytes: Buffer): Promise<WithId> {
  const headers = { 'content-type': 'application/octet-stream', 'x-filename': fileName };
  const answer = await send(caller, `/api/v1/evidence?fraction=${code}`, bytes, headers);
  return (answer as { evidence: WithId }).evidence;
}

function sendJson(caller: Caller, path: string, body: unknown): Promise<WithId> {
  const headers = { 'content-type': 'application/json' };
  return send(caller, path, Buffer.from(JSON.stringify(body)), headers) as Promise<WithId>;
}

/** A marked plate of the laboratory's fraction, made over HTTP; its id. */
export async function makePlate(caller: Caller, { run, fraction }: Laboratory): Promise<string> {
  const drawn = await drawPlatePhoto();
  const photo = await sendFile(caller, fraction.code, 'plate.jpg', drawn.jpeg);
  const plate = await sendJson(caller, `/api/v1/runs/${run.code}/plates`, {
    evidenceId: photo.id,
    stationaryPhase: 'silica gel 60 F254',
    eluent: 'hexane and ethyl acetate 4 : 1',
    visualiser: 'uv-254',
    units: 'px',
    baseline: [{ x: drawn.widthPx / 2, y: drawn.baselineY }],
    front: [{ x: drawn.widthPx / 2, y: drawn.frontY }],
    lanes: drawn.lanes.slice(0, 1).map(({ spots }) => ({
      label: '1',
      subject: { kind: 'fraction', code: fraction.code },
      spots: spots.map(({ x, y }) => ({ x, y })),
    })),
  });
  return plate.id;
}

/** A trace of the laboratory's fraction, read from a file of half a megabyte; its id. */
export async function makeTrace(caller: Caller, { fraction }: Laboratory): Promise<string> {
  const file = await sendFile(caller, fraction.code, 'trace.csv', buildTraceBytes(500_000));
  const body = { evidenceId: file.id, fraction: fraction.code, subject: 'fraction', detector: 'FID' };
  return (await sendJson(caller, '/api/v1/traces', body)).id;
}
