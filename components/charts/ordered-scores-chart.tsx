import { formatCount, formatScore, type ScoreKind } from '@/lib/format';
import { LeftAxis } from './axes';
import { ChartFigure } from './chart-figure';
import { MOST_MARKS, px, type ChartSize } from './chart-size';
import { ChartInTwoSizes } from './chart-svg';
import type { ScorePoint } from './chart-types';
import { describeScores, signalWords } from './describe';
import { EdgeValue } from './edge-value';
import { Mark, SignalShape, ThresholdLine } from './marks';
import {
  codeLabel,
  hasScore,
  orderedScoresGeometry,
  orderScores,
  type ScoreBar,
} from './ordered-scores-geometry';
import { thresholdsOf } from './score-scale';

export type OrderedScoresChartProps = {
  title: string;
  points: readonly ScorePoint[];
  scoreName?: string;
  scoreKind?: ScoreKind;
  fileName?: string;
  level?: 2 | 3 | 4;
};

/** The scores of a round in ascending order, one bar a participant code. */
export function OrderedScoresChart({
  title,
  points,
  scoreName = 'z',
  scoreKind = 'z',
  fileName = 'scores',
  level,
}: OrderedScoresChartProps) {
  const description = describeScores(points, scoreName, scoreKind);
  const scored = orderScores(points);
  const asWhole = scored.length > MOST_MARKS;
  const own = scored.find((point) => point.own);
  const missing = points.filter((point) => !hasScore(point));
  return (
    <ChartFigure
      title={title}
      level={level}
      fileName={fileName}
      note={`Vertical axis: ${scoreName}.`}
      caption={
        <>
          {description}{' '}
          {missing.length > 0 && `${formatCount(missing.length, 'participant')} not scored and left out. `}
          {own && `The maize bar is your laboratory, ${own.code}.`}
        </>
      }
      table={{
        columns: [{ label: 'Code' }, { label: scoreName, numeric: true, decimals: 2 }, { label: 'Signal' }],
        rows: [...scored, ...missing].map((point) => [
          point.own ? `${point.code} (own)` : point.code,
          hasScore(point) ? formatScore(point.score, scoreKind) : null,
          hasScore(point) ? (point.signal === 'none' ? '' : point.signal) : 'not scored',
        ]),
      }}
    >
      <ChartInTwoSizes
        name={title}
        description={description}
        asWhole={asWhole}
        draw={(size) => (
          <Drawing
            points={points}
            size={size}
            scoreName={scoreName}
            scoreKind={scoreKind}
            focusable={!asWhole}
          />
        )}
      />
    </ChartFigure>
  );
}

type DrawingProps = {
  points: readonly ScorePoint[];
  size: ChartSize;
  scoreName: string;
  scoreKind: ScoreKind;
  focusable: boolean;
};

function Drawing({ points, size, scoreName, scoreKind, focusable }: DrawingProps) {
  const geometry = orderedScoresGeometry(points, size);
  const { y, left, right, zero, bars, markSize, codesTop, step, top } = geometry;
  return (
    <>
      <LeftAxis scale={y} left={left} title={scoreName} />
      {thresholdsOf(scoreKind).map((line) => (
        <ThresholdLine key={line.at} {...line} x1={left} x2={right} y={y(line.at)} />
      ))}
      {bars.map((bar, index) => (
        <Mark
          key={`${bar.point.code}-${index}`}
          first={index === 0}
          focusable={focusable}
          detail={`${bar.point.code}${bar.point.own ? ' (own)' : ''}: ${scoreName} = ${formatScore(bar.point.score, scoreKind)}${signalWords(bar.point.signal)}`}
        >
          {focusable && <HitArea bar={bar} step={step} top={top} bottom={size.height - 6} />}
          <Bar bar={bar} markSize={markSize} codesTop={codesTop} scoreKind={scoreKind} />
        </Mark>
      ))}
      <line
        x1={left}
        x2={right}
        y1={zero}
        y2={zero}
        className="stroke-ink"
        strokeWidth="1"
        aria-hidden="true"
      />
    </>
  );
}

/** The whole column answers to the pointer: small bars would be hard to meet. */
function HitArea({ bar, step, top, bottom }: { bar: ScoreBar; step: number; top: number; bottom: number }) {
  return (
    <rect
      x={px(bar.middle - step / 2)}
      y={top}
      width={step}
      height={px(bottom - top)}
      className="fill-transparent"
    />
  );
}

type BarProps = { bar: ScoreBar; markSize: number; codesTop: number; scoreKind: ScoreKind };

function Bar({ bar, markSize, codesTop, scoreKind }: BarProps) {
  const { point, middle, tip, clamped } = bar;
  const outward = point.score < 0 ? 1 : -1;
  const ownStyle = point.own ? 'fill-maize stroke-ink' : 'fill-ink-faint';
  return (
    <>
      <rect
        x={bar.x}
        y={bar.y}
        width={bar.width}
        height={bar.height}
        className={ownStyle}
        strokeWidth={point.own ? 1.4 : 0}
      />
      {clamped === 0 ? (
        <SignalShape
          signal={point.signal}
          x={middle}
          y={tip + outward * (markSize / 2 + 3)}
          size={markSize}
        />
      ) : (
        <BeyondEdge bar={bar} outward={outward} markSize={markSize} scoreKind={scoreKind} />
      )}
      {bar.showsCode && (
        <text
          transform={`translate(${middle} ${codesTop}) rotate(-90)`}
          textAnchor="end"
          dy="0.35em"
          className={point.own ? 'fill-ink font-bold' : 'fill-ink-soft'}
        >
          {codeLabel(point)}
        </text>
      )}
    </>
  );
}

type BeyondEdgeProps = Omit<BarProps, 'codesTop'> & { outward: number };

function BeyondEdge({ bar, outward, markSize, scoreKind }: BeyondEdgeProps) {
  const { point, middle, tip } = bar;
  return (
    <>
      <SignalShape signal={point.signal} x={middle} y={tip - outward * (markSize / 2 + 2)} size={markSize} />
      <EdgeValue
        x={middle}
        y={tip}
        labelX={bar.valueX}
        text={formatScore(point.score, scoreKind)}
        up={outward < 0}
      />
    </>
  );
}
