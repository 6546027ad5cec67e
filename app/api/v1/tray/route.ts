import { route } from '@/lib/http/route';
import { listTray } from '@/lib/instruments/list-tray';
import { trayQuery, trayResponse } from '@/lib/instruments/tray-schema';

export const GET = route({
  summary: 'Files that wait for their fraction, the newest first',
  query: trayQuery,
  response: trayResponse,
  handle: async ({ actor, query }) => ({ json: await listTray(actor, query) }),
});
