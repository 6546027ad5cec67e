import { route } from '@/lib/http/route';
import { fileTrayItem } from '@/lib/instruments/file-tray-item';
import { filedResponse, fileTrayItemBody, trayItemId } from '@/lib/instruments/tray-schema';

export const POST = route({
  summary: 'Give a waiting file its fraction',
  params: trayItemId,
  body: fileTrayItemBody,
  response: filedResponse,
  handle: async ({ actor, params, body }) => ({ json: await fileTrayItem(actor, params.id, body.fraction) }),
});
