/** @module The histogram of replicas: the mixture of prescriptions, or the first one, with its median and its central 68 %. */
import type { Chart } from '../chart.js';
import { symbolLabel } from './words.js';

interface Number68 {
  readonly value: string;
}

interface Distribution {
  readonly replicas: number;
  readonly median: Number68;
  readonly low68: Number68;
  readonly high68: Number68;
  readonly low95: Number68;
  readonly high95: Number68;
  readonly histogram: readonly number[];
}

/** What the picture needs of an extraction's replicas. */
export interface DrawnReplicas {
  readonly seed: string;
  readonly quantities: readonly {
    readonly symbol: string;
    readonly unit?: string;
    readonly from: string;
    readonly to: string;
  }[];
  readonly rows: readonly {
    readonly prescription: string;
    readonly values: readonly { readonly distribution?: Distribution }[];
  }[];
  readonly mixture?: { readonly values: readonly { readonly distribution?: Distribution }[] };
}

export function replicasChart({ replicas }: { readonly replicas?: DrawnReplicas }): Chart {
  const quantity = replicas?.quantities[0];
  const rows = replicas?.rows ?? [];
  const mixture = replicas?.mixture?.values[0]?.distribution;
  const shown = mixture ?? rows[0]?.values[0]?.distribution;
  const whose = mixture === undefined ? (rows[0]?.prescription ?? '') : 'all stable prescriptions, drawn at random';
  const [from, to] = [Number(quantity?.from ?? 0), Number(quantity?.to ?? 1)];
  const histogram = shown?.histogram ?? [];
  const width = (to - from) / Math.max(1, histogram.length);
  const bins = histogram.map((count, i) => ({ from: from + i * width, to: from + (i + 1) * width, height: count }));
  const most = Math.max(...histogram, 1);
  const unit = quantity?.unit === undefined ? '' : ` [${quantity.unit}]`;
  return {
    title: `Replicas of ${quantity?.symbol ?? 'nothing'}: ${whose}`,
    description:
      shown === undefined
        ? 'No replica has a value.'
        : `${shown.replicas} replicas, seed ${replicas?.seed ?? ''}: median ${shown.median.value}, 68 per cent from ${shown.low68.value} to ${shown.high68.value}, 95 per cent from ${shown.low95.value} to ${shown.high95.value}.`,
    panels: [
      {
        x: { kind: 'linear', low: from, high: to, label: `${symbolLabel(quantity?.symbol ?? '')}${unit}`, margin: 0 },
        y: { kind: 'linear', low: 0, high: most, label: 'replicas', margin: 0.05 },
        layers: [
          ...(shown === undefined
            ? []
            : [
                {
                  kind: 'band',
                  along: 'x',
                  from: Number(shown.low68.value),
                  to: Number(shown.high68.value),
                  tone: 'first',
                  name: 'central 68 %',
                } as const,
              ]),
          { kind: 'columns', bins, ink: 0 },
          ...(shown === undefined
            ? []
            : [
                {
                  kind: 'rule',
                  along: 'x',
                  at: Number(shown.median.value),
                  line: 'dashed',
                  ink: 1,
                  name: 'median',
                } as const,
              ]),
        ],
        legend: 'inside',
      },
    ],
    data: [
      {
        name: 'histogram',
        columns: ['from', 'to', 'count'],
        rows: bins.map((bin) => [String(bin.from), String(bin.to), String(bin.height)]),
      },
    ],
  };
}
