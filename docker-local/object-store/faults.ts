import { StoreError } from './errors';

/**
 * Faults for tests, set by `PUT /_faults` with a JSON body; the route exists only when the server was started with
 * `allowFaults`. `failNth` counts matching calls from 1; `method` limits the fault to one HTTP method.
 */
export interface Faults {
  method?: string;
  failNth?: number;
  delayMs?: number;
  /** GET bodies end after so many bytes, and the connection is cut. */
  truncateAfterBytes?: number;
  /** The byte at this offset of a GET body comes back with its bits inverted. */
  flipByteAt?: number;
}

/** Keeps the faults in force and counts the calls they concern. */
export class FaultPlan {
  private faults: Faults = {};
  private calls = 0;

  set(faults: Faults): void {
    this.faults = faults;
    this.calls = 0;
  }

  /** Waits or throws as planned, and answers what is to be done to the body of this call. */
  async apply(method: string): Promise<Pick<Faults, 'truncateAfterBytes' | 'flipByteAt'>> {
    const { faults } = this;
    if (faults.method && faults.method !== method) return {};
    this.calls += 1;
    if (faults.delayMs) await new Promise((resolve) => setTimeout(resolve, faults.delayMs));
    if (faults.failNth === this.calls) throw new StoreError('InternalError', 'A planned fault.');
    return faults;
  }
}
