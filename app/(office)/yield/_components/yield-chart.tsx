'use client';

import {
  Bar,
  BarChart,
  CartesianGrid,
  ReferenceLine,
  ResponsiveContainer,
  XAxis,
  YAxis,
} from 'recharts';
import type { YieldJob } from '@/lib/contracts/yield';
import { yieldWords as words } from '@/lib/text/messages/en/yield';

const TICK = { fill: 'var(--ink-soft)', fontSize: 12 };
const BAR_PX = 34;

interface Bars {
  readonly title: string;
  readonly color: string;
  readonly points: readonly { readonly name: string; readonly value: number | null }[];
}

/** Overrun and cost a yard, job beside job. The table above says the same in figures. */
export function YieldChart({ rows }: { rows: readonly YieldJob[] }) {
  // Bars are drawn to the pixel: the only place where a figure becomes a float.
  const number = (text: string | null, times = 1) => (text === null ? null : Number(text) * times);
  const charts: Bars[] = [
    {
      title: words.chartOverrun,
      color: 'var(--keel)',
      points: rows.map((row) => ({ name: row.jobName, value: number(row.overrunShare, 100) })),
    },
    {
      title: words.chartCost,
      color: 'var(--carbon)',
      points: rows.map((row) => ({ name: row.jobName, value: number(row.costPerYd3) })),
    },
  ];
  return (
    <div aria-hidden className="grid gap-8 pb-8 lg:grid-cols-2">
      {charts.map(({ title, color, points }) => (
        <figure key={title}>
          <figcaption className="mb-1 text-[13px] font-semibold text-ink-soft">{title}</figcaption>
          <ResponsiveContainer width="100%" height={points.length * BAR_PX + 40}>
            <BarChart
              accessibilityLayer={false}
              data={[...points]}
              layout="vertical"
              margin={{ left: 0, right: 24 }}
            >
              <CartesianGrid horizontal={false} stroke="var(--cured)" />
              <XAxis type="number" tick={TICK} stroke="var(--wet)" />
              <YAxis type="category" dataKey="name" width={132} tick={TICK} stroke="var(--wet)" />
              <ReferenceLine x={0} stroke="var(--wet)" />
              <Bar dataKey="value" fill={color} isAnimationActive={false} barSize={16} />
            </BarChart>
          </ResponsiveContainer>
        </figure>
      ))}
    </div>
  );
}
