'use client';
import 'uplot/dist/uPlot.min.css';
import { useEffect, useId, useRef, useState } from 'react';
import type uPlot from 'uplot';
import { Button } from '@/components/ui/button';
import { peakPlugin, readColours, traceOptions, type TracePeak } from './trace-options';
import { nextRange, type RangeStep } from './trace-range';

export type TraceRange = { fromMin: number; toMin: number };

type TracePlotProps = {
  /** Names the picture: "GC trace of D-2026-0042-F3, FID". */
  name: string;
  /** Ascending, min. */
  timeMin: readonly number[];
  /** As long as timeMin. */
  signal: readonly number[];
  /** "pA", "mV", "counts". */
  signalUnit: string;
  /** Baseline at each point; null where there is none. */
  baseline?: readonly (number | null)[];
  peaks?: readonly TracePeak[];
  selectedPeak?: number | null;
  /** The id of the peak table, to which the picture points. */
  peakTableId?: string;
  /** Called with what is shown after each zoom; null when all of it is. */
  onRangeChange?: (range: TraceRange | null) => void;
  /** Called with the peak that was pressed in the picture; null for a place without one. */
  onSelectPeak?: (number: number | null) => void;
  height?: number;
};

const STEPS: readonly { step: RangeStep; label: string }[] = [
  { step: 'in', label: 'Zoom in' },
  { step: 'out', label: 'Zoom out' },
  { step: 'earlier', label: 'Earlier' },
  { step: 'later', label: 'Later' },
];

/** A chromatogram with its baseline and numbered peaks. The plotting library is fetched only when one is shown. */
export function TracePlot(props: TracePlotProps) {
  const {
    name,
    timeMin,
    signal,
    signalUnit,
    baseline,
    peaks = [],
    selectedPeak = null,
    peakTableId,
    height = 360,
  } = props;
  const boxRef = useRef<HTMLDivElement>(null);
  const plotRef = useRef<uPlot | null>(null);
  const { onRangeChange, onSelectPeak } = props;
  const latest = useRef({ peaks, selectedPeak, onRangeChange, onSelectPeak });
  // Outlives the data: finer points of the part that is shown must not throw the reader back to the whole.
  const keptRef = useRef<{ min: number; max: number } | null>(null);
  const [range, setRange] = useState<TraceRange | null>(null);
  const [state, setState] = useState<'loading' | 'shown' | 'failed'>('loading');
  const noteId = useId();
  const first = timeMin[0] ?? 0;
  const last = timeMin.at(-1) ?? 0;

  useEffect(() => {
    latest.current = { peaks, selectedPeak, onRangeChange, onSelectPeak };
    plotRef.current?.redraw(false);
  });

  useEffect(() => {
    const box = boxRef.current;
    if (!box) return;
    let gone = false;
    let UPlot: typeof uPlot | null = null;

    function draw() {
      if (gone || !box || !UPlot) return;
      plotRef.current?.destroy();
      const colours = readColours(box);
      const plugin = peakPlugin(
        () => latest.current.peaks,
        () => latest.current.selectedPeak,
        colours,
      );
      plugin.hooks.setScale = (plot, key) => {
        if (key !== 'x' || plot.scales.x!.min == null) return;
        const [min, max] = [plot.scales.x!.min, plot.scales.x!.max!];
        const whole = min <= first && max >= last;
        keptRef.current = whole ? null : { min, max };
        const shown = whole ? null : { fromMin: min, toMin: max };
        setRange(shown);
        latest.current.onRangeChange?.(shown);
      };
      plugin.hooks.ready = (plot) =>
        plot.over.addEventListener('click', (event) => {
          const at = plot.posToVal(event.clientX - plot.over.getBoundingClientRect().left, 'x');
          const hit = latest.current.peaks.find((peak) => peak.startMin <= at && at <= peak.endMin);
          latest.current.onSelectPeak?.(hit?.number ?? null);
        });
      const size = { width: Math.max(200, box.clientWidth), height };
      const data = [timeMin, signal, baseline ?? timeMin.map(() => null)] as unknown as uPlot.AlignedData;
      plotRef.current = new UPlot(traceOptions(size, signalUnit, colours, plugin), data, box);
      if (keptRef.current) plotRef.current.setScale('x', keptRef.current);
      setState('shown');
    }

    import('uplot')
      .then((module) => {
        UPlot = module.default;
        draw();
      })
      .catch(() => !gone && setState('failed'));
    const resize = new ResizeObserver(() =>
      plotRef.current?.setSize({ width: Math.max(200, box.clientWidth), height }),
    );
    resize.observe(box);
    const theme = new MutationObserver(draw);
    theme.observe(document.documentElement, { attributes: true, attributeFilter: ['data-theme'] });
    // The theme of the device, and paper: a dark trace is drawn again in ink before it is printed.
    const media = [matchMedia('(prefers-color-scheme: dark)'), matchMedia('print')];
    media.forEach((query) => query.addEventListener('change', draw));
    return () => {
      gone = true;
      resize.disconnect();
      theme.disconnect();
      media.forEach((query) => query.removeEventListener('change', draw));
      plotRef.current?.destroy();
      plotRef.current = null;
    };
  }, [timeMin, signal, baseline, signalUnit, height, first, last]);

  function go(step: RangeStep) {
    const next = nextRange(range ?? { fromMin: first, toMin: last }, { fromMin: first, toMin: last }, step);
    plotRef.current?.setScale('x', { min: next.fromMin, max: next.toMin });
  }

  return (
    <figure className="print-whole" aria-describedby={noteId}>
      <div className="rounded border border-line bg-paper-raised p-2">
        <div
          ref={boxRef}
          role="img"
          aria-label={`${name}. ${peaks.length} numbered ${peaks.length === 1 ? 'peak' : 'peaks'}.`}
          style={{ minHeight: height }}
          className="w-full overflow-hidden [contain:inline-size]"
        >
          {state === 'loading' ? <p className="animate-fade p-4 text-ink-soft">Drawing the trace …</p> : null}
          {state === 'failed' ? (
            <p className="p-4">
              The trace could not be drawn. Load the page again; the peak table is complete without it.
            </p>
          ) : null}
        </div>
      </div>
      <div
        className="mt-2 flex flex-wrap items-center gap-2 no-print"
        role="group"
        aria-label="Part of the trace that is shown"
      >
        {STEPS.map(({ step, label }) => (
          <Button key={step} onClick={() => go(step)} className="px-3">
            {label}
          </Button>
        ))}
        <Button variant="quiet" onClick={() => go('all')}>
          Whole trace
        </Button>
        <span role="status" className="text-sm text-ink-soft">
          {range
            ? `${range.fromMin.toFixed(2)} to ${range.toMin.toFixed(2)} min`
            : `all ${last.toFixed(1)} min`}
        </span>
      </div>
      <figcaption id={noteId} className="mt-1 text-sm text-ink-soft no-print">
        Drag over the trace to zoom.{' '}
        {peakTableId ? (
          <a href={`#${peakTableId}`} className="link">
            The peak table says the same in numbers.
          </a>
        ) : null}
      </figcaption>
    </figure>
  );
}
