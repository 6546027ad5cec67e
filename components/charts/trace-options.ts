import type uPlot from 'uplot';

export type TracePeak = {
  number: number;
  startMin: number;
  apexMin: number;
  endMin: number;
  /** Short name, such as the assigned compound; the number alone is drawn without it. */
  name?: string | null;
};

export type TraceColours = Record<
  'ink' | 'ink-soft' | 'line' | 'glass' | 'glass-wash' | 'paper-raised',
  string
>;

/** Resolves the theme's variables, which are light-dark() pairs, to colours that a canvas understands. */
export function readColours(within: HTMLElement): TraceColours {
  const probe = document.createElement('span');
  within.append(probe);
  const names = ['ink', 'ink-soft', 'line', 'glass', 'glass-wash', 'paper-raised'] as const;
  const colours = Object.fromEntries(
    names.map((name) => {
      probe.style.color = `var(--${name})`;
      return [name, getComputedStyle(probe).color];
    }),
  ) as TraceColours;
  probe.remove();
  return colours;
}

/** First index whose time is not before `timeMin`, by bisection; `time` ascends. */
export function indexAt(time: ArrayLike<number>, timeMin: number): number {
  let low = 0;
  let high = time.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (time[middle]! < timeMin) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** Draws the peaks on a trace: area over the baseline shaded, edges ticked, number (and name where there is room) on top. */
export function peakPlugin(
  peaks: () => readonly TracePeak[],
  selected: () => number | null,
  colours: TraceColours,
): uPlot.Plugin {
  return {
    hooks: {
      drawSeries: (plot, series) => {
        if (series === 2)
          peaks().forEach((peak) => shadePeak(plot, peak, peak.number === selected(), colours));
      },
      draw: (plot) => labelPeaks(plot, peaks(), selected(), colours),
    },
  };
}

function shadePeak(plot: uPlot, peak: TracePeak, isSelected: boolean, colours: TraceColours) {
  const [time, signal, baseline] = plot.data as unknown as [number[], number[], (number | null)[]];
  const from = indexAt(time, peak.startMin);
  const to = Math.min(time.length - 1, indexAt(time, peak.endMin));
  const { ctx } = plot;
  const { left, top, width, height } = plot.bbox;
  ctx.save();
  ctx.beginPath();
  ctx.rect(left, top, width, height);
  ctx.clip();
  ctx.beginPath();
  for (let at = from; at <= to; at += 1)
    ctx.lineTo(plot.valToPos(time[at]!, 'x', true), plot.valToPos(signal[at]!, 'y', true));
  for (let at = to; at >= from; at -= 1) {
    const base = baseline?.[at] ?? plot.scales.y!.min ?? 0;
    ctx.lineTo(plot.valToPos(time[at]!, 'x', true), plot.valToPos(base, 'y', true));
  }
  ctx.closePath();
  ctx.globalAlpha = isSelected ? 0.55 : 0.22;
  ctx.fillStyle = colours.glass;
  ctx.fill();
  ctx.restore();
}

function labelPeaks(
  plot: uPlot,
  peaks: readonly TracePeak[],
  selected: number | null,
  colours: TraceColours,
) {
  const [time, signal] = plot.data as unknown as [number[], number[]];
  const { ctx } = plot;
  const { left, top, width } = plot.bbox;
  const px = devicePixelRatio;
  ctx.save();
  ctx.textAlign = 'center';
  ctx.textBaseline = 'bottom';
  let freeFrom = -Infinity;
  for (const peak of [...peaks].sort((a, b) => a.apexMin - b.apexMin)) {
    const x = plot.valToPos(peak.apexMin, 'x', true);
    if (x < left || x > left + width) continue;
    const at = Math.min(time.length - 1, indexAt(time, peak.apexMin));
    const y = Math.max(top + 16 * px, plot.valToPos(signal[at]!, 'y', true) - 5 * px);
    ctx.font = `700 ${12 * px}px Lato, sans-serif`;
    const full = peak.name ? `${peak.number} ${peak.name}` : String(peak.number);
    const roomy = x - ctx.measureText(full).width / 2 > freeFrom + 6 * px;
    const text = roomy || peak.number === selected ? full : String(peak.number);
    const half = ctx.measureText(text).width / 2;
    // A label that would lie on its neighbour is left out; the table has every peak.
    if (x - half <= freeFrom && peak.number !== selected) continue;
    freeFrom = x + half;
    ctx.lineWidth = 4 * px;
    ctx.strokeStyle = colours['paper-raised'];
    ctx.strokeText(text, x, y);
    ctx.fillStyle = peak.number === selected ? colours.glass : colours.ink;
    ctx.fillText(text, x, y);
  }
  ctx.restore();
}

/** Options of the plot: drag along x zooms, no legend (the peak table is the legend), axes in the theme's colours. */
export function traceOptions(
  size: { width: number; height: number },
  signalUnit: string,
  colours: TraceColours,
  plugin: uPlot.Plugin,
): uPlot.Options {
  const font = '12px Lato, sans-serif';
  const axis = {
    stroke: colours['ink-soft'],
    font,
    labelFont: font,
    grid: { stroke: colours.line, width: 1 },
    ticks: { stroke: colours.line, width: 1 },
  };
  return {
    ...size,
    legend: { show: false },
    cursor: { drag: { x: true, y: false, dist: 6 }, points: { show: false }, y: false },
    scales: {
      x: { time: false },
      y: { range: (_plot, low, high) => [low - (high - low) * 0.04, high + (high - low) * 0.12 || high + 1] },
    },
    axes: [
      { ...axis, label: 'time / min', labelSize: 22, size: 32 },
      { ...axis, label: `signal / ${signalUnit}`, labelSize: 22, size: 56 },
    ],
    series: [
      {},
      { stroke: colours.ink, width: 1.25, points: { show: false } },
      { stroke: colours['ink-soft'], width: 1, dash: [5, 3], points: { show: false }, spanGaps: false },
    ],
    plugins: [plugin],
  };
}
