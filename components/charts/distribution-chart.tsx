import { AreaClosed, LinePath } from '@visx/shape';
import { scaleLinear } from '@visx/scale';
import { formatCount, formatNumber } from '@/lib/format';
import { BottomAxis } from './axes';
import { ChartFigure } from './chart-figure';
import { MOST_MARKS, type ChartSize } from './chart-size';
import { ChartInTwoSizes } from './chart-svg';
import type { AssignedValue, ResultPoint } from './chart-types';
import type { CurvePoint } from './density-curve';
import { describeResults, signalWords } from './describe';
import { distributionGeometry, type ResultMark, type SigmaLine } from './distribution-geometry';
import { EdgeArrow, Mark, ResultShape } from './marks';
import { SigmaLabel } from './sigma-label';

export type DistributionChartProps = {
  title: string;
  results: readonly ResultPoint[];
  assigned: AssignedValue;
  unit: string;
  decimals: number;
  leftOut?: number;
  density?: readonly CurvePoint[];
  bandwidth?: number;
  fileName?: string;
  level?: 2 | 3 | 4;
};

/** The results of a round as a density curve, with every result as a mark below it. */
export function DistributionChart(props: DistributionChartProps) {
  const { title, results, unit, decimals, leftOut = 0, fileName = 'distribution', level } = props;
  const description = describeResults(results, props);
  const asWhole = results.length > MOST_MARKS;
  const own = results.find((result) => result.own);
  return (
    <ChartFigure
      title={title}
      level={level}
      fileName={fileName}
      note={`Horizontal axis: result in ${unit}.`}
      caption={
        <>
          {description} {leftOut > 0 && `${formatCount(leftOut, 'result')} without a figure left out. `}
          Lines stand at the assigned value and at 2 and 3 sigma_pt on either side. {curveWords(props)}
          {own && ` The maize disc is your laboratory, ${own.code}.`}
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

function curveWords({ density, bandwidth, assigned, unit, decimals }: DistributionChartProps): string {
  if (density) return '';
  const width = formatNumber(bandwidth ?? 0.75 * assigned.sigmaPt, decimals + 1);
  return `The curve is a Gaussian kernel density of bandwidth ${width} ${unit}.`;
}

type DrawingProps = DistributionChartProps & { size: ChartSize; focusable: boolean };

function Drawing({ size, focusable, unit, decimals, ...input }: DrawingProps) {
  const geometry = distributionGeometry(input, size);
  const { x, baseline, axisTop, curve, marks, diameter } = geometry;
  return (
    <>
      <Curve curve={curve} baseline={baseline} />
      <g aria-hidden="true">
        {geometry.lines.map((line) => (
          <VerticalLine key={line.multiple} line={line} top={geometry.top} bottom={axisTop} />
        ))}
        <line
          x1={geometry.left}
          x2={geometry.right}
          y1={baseline}
          y2={baseline}
          className="stroke-rule-strong"
        />
      </g>
      <BottomAxis scale={x} top={axisTop} count={size.width > 500 ? 9 : 5} title={`Result in ${unit}`} />
      {marks.map((mark, index) => (
        <Mark
          key={`${mark.point.code}-${index}`}
          first={index === 0}
          focusable={focusable}
          detail={`${mark.point.code}${mark.point.own ? ' (own)' : ''}: ${formatNumber(mark.point.value, decimals)} ${unit}${signalWords(mark.point.signal)}`}
        >
          {mark.clamped === 0 ? (
            <ResultShape {...mark.point} x={mark.x} y={mark.y} size={diameter} />
          ) : (
            <BeyondEdge mark={mark} decimals={decimals} />
          )}
        </Mark>
      ))}
    </>
  );
}

function Curve({ curve, baseline }: { curve: CurvePoint[]; baseline: number }) {
  if (curve.length === 0) return null;
  const heights = scaleLinear<number>({ domain: [0, baseline], range: [0, baseline] });
  const place = { x: (point: CurvePoint) => point.x, y: (point: CurvePoint) => point.y };
  return (
    <g aria-hidden="true">
      <AreaClosed data={curve} {...place} y0={baseline} yScale={heights} className="fill-paper-wash" />
      <LinePath data={curve} {...place} className="stroke-ink" strokeWidth={1.6} fill="none" />
    </g>
  );
}

const LINE_LOOKS: Record<0 | 2 | 3, { className: string; strokeDasharray?: string; strokeWidth: number }> = {
  0: { className: 'stroke-ink', strokeWidth: 1.6 },
  2: { className: 'stroke-warning', strokeDasharray: '5 4', strokeWidth: 1 },
  3: { className: 'stroke-action', strokeWidth: 1 },
};

function VerticalLine({ line, top, bottom }: { line: SigmaLine; top: number; bottom: number }) {
  const size = Math.abs(line.multiple) as 0 | 2 | 3;
  return (
    <g>
      <line x1={line.x} x2={line.x} y1={top} y2={bottom} {...LINE_LOOKS[size]} />
      <SigmaLabel multiple={line.multiple} x={line.x} y={top - 11} textAnchor="middle" />
    </g>
  );
}

function BeyondEdge({ mark, decimals }: { mark: ResultMark; decimals: number }) {
  const right = mark.clamped === 1;
  const inward = right ? -1 : 1;
  return (
    <>
      <EdgeArrow x={mark.x + inward * 2} y={mark.y} direction={right ? 'right' : 'left'} />
      <ResultShape {...mark.point} x={mark.x + inward * 13} y={mark.y} size={9} />
      <text
        x={mark.x + inward * 22}
        y={mark.y}
        dy="0.35em"
        textAnchor={right ? 'end' : 'start'}
        className="fill-ink"
      >
        {formatNumber(mark.point.value, decimals)}
      </text>
    </>
  );
}
