import { Op } from 'sequelize';
import { type Actor, visibleGroupIds } from '@/lib/auth/actor';
import { whyNot } from '@/lib/auth/authorise';
import { Compound, EvidenceFile, Fraction, Integration, Peak, Run, Trace } from '@/lib/database/records';
import { notFound } from '@/lib/errors';
import { decodeCursor, encodeCursor, type Page, toPage } from '@/lib/http/paging';
import { kindFacts } from '../kinds';
import { presentIntegration, presentIntegrationRow, presentTrace, presentTraceRow } from './present';
import { requireTrace } from './require-trace';
import type {
  IntegrationJson,
  IntegrationListQuery,
  IntegrationRow,
  TraceJson,
  TraceListQuery,
  TraceRow,
} from './schema';

/** A trace with its integration in force; 404 for what is not visible. */
export async function readTrace(actor: Actor, id: string): Promise<TraceJson> {
  const place = await requireTrace(actor, id);
  const { trace } = place;
  const integration = await Integration.findByPk(trace.inForceIntegrationId ?? '');
  if (!integration) throw new Error(`Trace ${id} has no integration in force`);
  return presentTrace(trace, place, await withPeaks(integration, trace));
}

/** What the page of a trace needs: the trace, and why this person may not integrate it, or null. */
export async function readTracePage(
  actor: Actor,
  id: string,
): Promise<{ trace: TraceJson; whyNotWrite: string | null }> {
  const { trace } = await requireTrace(actor, id);
  return {
    trace: await readTrace(actor, id),
    whyNotWrite: whyNot(actor, 'trace.write', trace.groupId),
  };
}

/** One version of an integration; 404 where its trace is not visible. */
export async function readIntegration(actor: Actor, id: string): Promise<IntegrationJson> {
  const groupId = visibleGroupIds(actor);
  const integration = await Integration.findByPk(id);
  const trace = integration && (await Trace.findOne({ where: { id: integration.traceId, groupId } }));
  if (!integration || !trace) throw notFound('integration');
  return withPeaks(integration, trace);
}

async function withPeaks(integration: Integration, trace: Trace): Promise<IntegrationJson> {
  const peaks = await Peak.findAll({
    where: { integrationId: integration.id },
    order: [['number', 'ASC']],
  });
  const ids = peaks.flatMap((peak) => peak.compoundId ?? []);
  const compounds = await Compound.findAll({ where: { id: ids } });
  return presentIntegration(integration, peaks, compounds, trace.inForceIntegrationId);
}

/** Versions of a trace's integration, the newest first, one keyset page. */
export async function listIntegrations(
  actor: Actor,
  traceId: string,
  { limit, cursor }: IntegrationListQuery,
): Promise<Page<IntegrationRow>> {
  const { trace } = await requireTrace(actor, traceId);
  const before = cursor === undefined ? undefined : decodeCursor('-version', cursor, ['number'])[0];
  const rows = await Integration.findAll({
    where: { traceId: trace.id, ...(before !== undefined && { number: { [Op.lt]: before } }) },
    order: [['number', 'DESC']],
    limit: limit + 1,
  });
  const peaks = await Peak.findAll({
    attributes: ['integrationId'],
    where: { integrationId: rows.map((row) => row.id) },
  });
  const countOf = (id: string) => peaks.filter((peak) => peak.integrationId === id).length;
  return toPage(
    rows,
    limit,
    (row) => presentIntegrationRow(row, trace.inForceIntegrationId, countOf(row.id)),
    (row) => encodeCursor('-version', [row.number]),
  );
}

/** Traces of the caller's groups, the newest first, of a run or a fraction if asked; one keyset page. */
export async function listTraces(actor: Actor, query: TraceListQuery): Promise<Page<TraceRow>> {
  const groupId = visibleGroupIds(actor);
  const run = query.run && (await Run.findOne({ where: { code: query.run, groupId } }));
  const fraction = query.fraction && (await Fraction.findOne({ where: { code: query.fraction, groupId } }));
  // An unknown code finds nothing, as any other filter without a match.
  if ((query.run && !run) || (query.fraction && !fraction)) return { items: [], nextCursor: null };
  const rows = await Trace.findAll({
    where: {
      groupId,
      ...(run && { runId: run.id }),
      ...(fraction && { fractionId: fraction.id }),
      ...(query.cursor !== undefined && after(query.cursor)),
    },
    order: [
      ['createdAt', 'DESC'],
      ['id', 'DESC'],
    ],
    limit: query.limit + 1,
  });
  const place = await placesOf(rows);
  return toPage(
    rows,
    query.limit,
    (row) => presentTraceRow(row, place(row)),
    (row) => encodeCursor('-createdAt', [row.createdAt.toISOString(), row.id]),
  );
}

/** Files of a fraction, and of its run as a whole, that may hold a trace; the newest first. */
export async function listTraceFiles(
  actor: Actor,
  fraction: { id: string; runId: string },
): Promise<{ id: string; fileName: string }[]> {
  const files = await EvidenceFile.findAll({
    where: {
      groupId: visibleGroupIds(actor),
      mediaType: [...kindFacts['gc-trace'].mediaTypes],
      [Op.or]: [{ fractionId: fraction.id }, { runId: fraction.runId, fractionId: null }],
    },
    order: [['createdAt', 'DESC']],
    limit: 200,
  });
  return files.map(({ id, fileName }) => ({ id, fileName }));
}

function after(cursor: string) {
  const [at, id] = decodeCursor('-createdAt', cursor, ['instant', 'id']);
  const time = new Date(at);
  return {
    createdAt: { [Op.lte]: time },
    [Op.or]: [{ createdAt: { [Op.lt]: time } }, { id: { [Op.lt]: id } }],
  };
}

async function placesOf(rows: readonly Trace[]) {
  const [files, runs, fractions] = await Promise.all([
    EvidenceFile.findAll({ where: { id: rows.map((row) => row.evidenceId) } }),
    Run.findAll({ where: { id: rows.map((row) => row.runId) } }),
    Fraction.findAll({ where: { id: rows.flatMap((row) => row.fractionId ?? []) } }),
  ]);
  return (row: Trace) => ({
    evidence: files.find((file) => file.id === row.evidenceId)!,
    run: runs.find((run) => run.id === row.runId)!,
    fraction: fractions.find((fraction) => fraction.id === row.fractionId) ?? null,
  });
}
