import canonicalize from 'canonicalize';
import { objectKeyFor } from '@/storage/keys';
import { readObject } from '@/storage/read-object';
import { kindFacts } from '../kinds';
import { type ParsedTrace, parseTrace } from './parse-trace';
import type { ReadOptions } from './schema';

type Source = { sha256: string; mediaType: string };

/** Points kept in memory at most, over all traces: 16 bytes each. */
const mostPoints = 6_000_000;

/** A few parsed traces by file and reading, the longest unused forgotten first. A file never changes, so nor does its entry. */
class TraceCache {
  private readonly entries = new Map<string, ParsedTrace>();
  private points = 0;

  get(key: string): ParsedTrace | undefined {
    const found = this.entries.get(key);
    if (found) {
      this.entries.delete(key);
      this.entries.set(key, found);
    }
    return found;
  }

  set(key: string, trace: ParsedTrace): void {
    const size = trace.points.signal.length;
    if (size > mostPoints || this.entries.has(key)) return;
    this.entries.set(key, trace);
    this.points += size;
    for (const [oldest, entry] of this.entries) {
      if (this.points <= mostPoints) break;
      this.entries.delete(oldest);
      this.points -= entry.points.signal.length;
    }
  }
}

const cache = new TraceCache();
const underWay = new Map<string, Promise<ParsedTrace>>();

/**
 * The points of a stored trace, parsed once and kept for the next look; calls at the same time share one parse.
 * 422 as parseTrace; StorageError when the store does not answer.
 */
export async function readTracePoints(source: Source, read: ReadOptions): Promise<ParsedTrace> {
  const key = `${source.sha256} ${canonicalize(read)}`;
  const known = cache.get(key) ?? underWay.get(key);
  if (known) return known;
  const parsing = parseStored(source, read);
  underWay.set(key, parsing);
  try {
    const trace = await parsing;
    cache.set(key, trace);
    return trace;
  } finally {
    underWay.delete(key);
  }
}

async function parseStored(source: Source, read: ReadOptions): Promise<ParsedTrace> {
  const bytes = await readObject(objectKeyFor(source.sha256), { maxBytes: kindFacts['gc-trace'].maxBytes });
  return parseTrace(bytes, source.mediaType, read);
}
