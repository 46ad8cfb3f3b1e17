import { formatCount, formatNumber } from '@/lib/format';
import { LeftAxis } from './axes';
import { ChartFigure } from './chart-figure';
import { MOST_MARKS, type ChartSize } from './chart-size';
import { ChartInTwoSizes } from './chart-svg';
import type { AssignedValue, ResultPoint } from './chart-types';
import { describeResults, signalWords } from './describe';
import { EdgeValue } from './edge-value';
import { Mark, ResultShape, SignalShape } from './marks';
import { roundBarsGeometry, type RoundBar } from './round-bars-geometry';
import { SigmaLabel } from './sigma-label';

export type RoundBarsProps = {
  title: string;
  results: readonly ResultPoint[];
  assigned: AssignedValue;
  unit: string;
  decimals: number;
  leftOut?: number;
  fileName?: string;
  level?: 2 | 3 | 4;
};

/** All results of a round in ascending order, with the reader's own as a bar from the assigned value. */
export function RoundBars(props: RoundBarsProps) {
  const { title, results, unit, decimals, leftOut = 0, fileName = 'own-result', level } = props;
  const description = describeResults(results, props);
  const own = results.find((result) => result.own);
  const asWhole = results.length > MOST_MARKS;
  return (
    <ChartFigure
      title={title}
      level={level}
      fileName={fileName}
      note={`Vertical axis: result in ${unit}.`}
      caption={
        <>
          {own &&
            `The maize bar is your laboratory, ${own.code}: ${formatNumber(own.value, decimals)} ${unit}. `}
          {description}
          {leftOut > 0 && ` ${formatCount(leftOut, 'result')} without a figure left out.`}
        </>
      }
      table={{
        columns: [{ label: 'Code' }, { label: `Result in ${unit}`, decimals }, { label: 'Signal' }],
        rows: [...results]
          .sort((a, b) => a.value - b.value)
          .map((result) => [
            result.own ? `${result.code} (own)` : result.code,
            result.value,
            result.signal && result.signal !== 'none' ? result.signal.replace('-', ' ') : '',
          ]),
      }}
    >
      <ChartInTwoSizes
        name={title}
        description={description}
        asWhole={asWhole}
        draw={(size) => <Drawing {...props} size={size} focusable={!asWhole} />}
      />
    </ChartFigure>
  );
}

const LINES: Record<0 | 2 | 3, { className: string; strokeDasharray?: string }> = {
  0: { className: 'stroke-ink' },
  2: { className: 'stroke-warning', strokeDasharray: '5 4' },
  3: { className: 'stroke-action' },
};

function Drawing({
  size,
  focusable,
  unit,
  decimals,
  ...input
}: RoundBarsProps & { size: ChartSize; focusable: boolean }) {
  const { y, bars, left, right, lines, assignedY, markSize } = roundBarsGeometry(input, size);
  return (
    <>
      <LeftAxis scale={y} left={left} title={unit} />
      <g aria-hidden="true">
        {lines.map((line) => (
          <g key={line.multiple}>
            <line
              x1={left}
              x2={right}
              y1={line.y}
              y2={line.y}
              {...LINES[Math.abs(line.multiple) as 0 | 2 | 3]}
            />
            <SigmaLabel multiple={line.multiple} x={right + 6} y={line.y} textAnchor="start" />
          </g>
        ))}
      </g>
      {bars.map((bar, index) => (
        <Mark
          key={`${bar.point.code}-${index}`}
          first={index === 0}
          focusable={focusable}
          detail={`${bar.point.code}${bar.point.own ? ' (own)' : ''}: ${formatNumber(bar.point.value, decimals)} ${unit}${signalWords(bar.point.signal)}`}
        >
          {bar.point.own ? (
            <OwnBar bar={bar} assignedY={assignedY} markSize={markSize} />
          ) : (
            <ResultShape signal={bar.point.signal} x={bar.x} y={bar.y} size={markSize} />
          )}
          {bar.clamped !== 0 && (
            <EdgeValue
              x={bar.x}
              y={bar.y + (bar.clamped === 1 ? -6 : 6)}
              labelX={bar.valueX}
              text={formatNumber(bar.point.value, decimals)}
              up={bar.clamped === 1}
            />
          )}
        </Mark>
      ))}
    </>
  );
}

const OWN_WIDTH = 12;

function OwnBar({ bar, assignedY, markSize }: { bar: RoundBar; assignedY: number; markSize: number }) {
  const top = Math.min(bar.y, assignedY);
  const below = bar.y >= assignedY;
  const size = Math.max(markSize, 8);
  return (
    <>
      <rect
        x={bar.x - OWN_WIDTH / 2}
        y={top}
        width={OWN_WIDTH}
        height={Math.max(2, Math.abs(bar.y - assignedY))}
        className="fill-maize stroke-ink"
        strokeWidth="1.4"
      />
      {bar.clamped === 0 && (
        <SignalShape signal={bar.point.signal} x={bar.x} y={bar.y + (below ? 9 : -9)} size={size} />
      )}
      <text
        x={bar.x}
        y={below ? assignedY - 8 : assignedY + 17}
        textAnchor="middle"
        className="fill-ink stroke-paper font-bold [paint-order:stroke]"
        strokeWidth="3"
      >
        {bar.point.code} own
      </text>
    </>
  );
}
