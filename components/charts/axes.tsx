import { AxisBottom, AxisLeft } from '@visx/axis';
import type { scaleLinear } from '@visx/scale';
import { formatNumber } from '@/lib/format';

type LinearScale = ReturnType<typeof scaleLinear<number>>;
type TickText = { x: number; y: number; formattedValue?: string };

/** Decimals that tell the ticks of a scale apart. */
export function tickDecimals(ticks: readonly number[]): number {
  const step = Math.abs((ticks[1] ?? 1) - (ticks[0] ?? 0));
  if (step === 0) return 0;
  return Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
}

function LeftTick({ x, y, formattedValue }: TickText) {
  return (
    <text x={x} y={y} dx={-2} dy="0.35em" textAnchor="end" className="fill-ink-soft">
      {formattedValue}
    </text>
  );
}

function BottomTick({ x, y, formattedValue }: TickText) {
  return (
    <text x={x} y={y} dy="0.2em" textAnchor="middle" className="fill-ink-soft">
      {formattedValue}
    </text>
  );
}

const LINE = {
  stroke: 'currentColor',
  tickStroke: 'currentColor',
  axisLineClassName: 'text-rule-strong',
  tickClassName: 'text-rule-strong',
};

export function LeftAxis({
  scale,
  left,
  count = 6,
  title,
}: {
  scale: LinearScale;
  left: number;
  count?: number;
  title: string;
}) {
  const ticks = scale.ticks(count);
  const decimals = tickDecimals(ticks);
  const top = Math.min(...scale.range());
  return (
    <g aria-hidden="true">
      <AxisLeft
        {...LINE}
        scale={scale}
        left={left}
        tickValues={ticks}
        tickLength={4}
        tickFormat={(value) => formatNumber(Number(value), decimals)}
        tickComponent={LeftTick}
      />
      <text x={4} y={Math.max(12, top - 12)} className="fill-ink">
        {title}
      </text>
    </g>
  );
}

export function BottomAxis({
  scale,
  top,
  count = 8,
  title,
}: {
  scale: LinearScale;
  top: number;
  count?: number;
  title: string;
}) {
  const ticks = scale.ticks(count);
  const decimals = tickDecimals(ticks);
  const right = Math.max(...scale.range());
  return (
    <g aria-hidden="true">
      <AxisBottom
        {...LINE}
        scale={scale}
        top={top}
        tickValues={ticks}
        tickLength={4}
        tickFormat={(value) => formatNumber(Number(value), decimals)}
        tickComponent={BottomTick}
      />
      <text x={right} y={top + 40} textAnchor="end" className="fill-ink">
        {title}
      </text>
    </g>
  );
}
