import { LinePath } from '@visx/shape';
import { formatCount, formatScore, type ScoreKind } from '@/lib/format';
import { LeftAxis } from './axes';
import { ChartFigure } from './chart-figure';
import { MOST_MARKS, type ChartSize } from './chart-size';
import { ChartInTwoSizes } from './chart-svg';
import type { TrendPoint } from './chart-types';
import { describeTrend, signalWords } from './describe';
import { EdgeArrow, Mark, ResultShape, ThresholdLine } from './marks';
import { thresholdsOf } from './score-scale';
import { trendGeometry, type TrendMark } from './trend-geometry';

export type ScoreTrendChartProps = {
  title: string;
  rounds: readonly TrendPoint[];
  scoreName?: string;
  scoreKind?: ScoreKind;
  fileName?: string;
  level?: 2 | 3 | 4;
};

/** The score of one laboratory over rounds, oldest first. */
export function ScoreTrendChart({
  title,
  rounds,
  scoreName = 'z',
  scoreKind = 'z',
  fileName = 'trend',
  level,
}: ScoreTrendChartProps) {
  const description = describeTrend(rounds, scoreName, scoreKind);
  const missing = rounds.filter((round) => round.score === null || round.signal === 'not-scored').length;
  const asWhole = rounds.length > MOST_MARKS;
  return (
    <ChartFigure
      title={title}
      level={level}
      fileName={fileName}
      note={`Vertical axis: ${scoreName}. Horizontal axis: rounds, oldest first.`}
      caption={
        <>
          {description}
          {missing > 0 &&
            ` ${formatCount(missing, 'round')} without a score ${missing === 1 ? 'is' : 'are'} left out; the line is broken there.`}
        </>
      }
      table={{
        columns: [{ label: 'Round' }, { label: scoreName, numeric: true, decimals: 2 }, { label: 'Signal' }],
        rows: rounds.map((round) => [
          round.label,
          round.score === null ? null : formatScore(round.score, scoreKind),
          [round.signal === 'none' ? '' : round.signal.replace('-', ' '), round.note ?? '']
            .filter(Boolean)
            .join('; '),
        ]),
      }}
    >
      <ChartInTwoSizes
        name={title}
        description={description}
        asWhole={asWhole}
        draw={(size) => (
          <Drawing
            rounds={rounds}
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
  rounds: readonly TrendPoint[];
  size: ChartSize;
  scoreName: string;
  scoreKind: ScoreKind;
  focusable: boolean;
};

function Drawing({ rounds, size, scoreName, scoreKind, focusable }: DrawingProps) {
  const { y, left, right, bottom, marks, runs, labels } = trendGeometry(rounds, size);
  return (
    <>
      <LeftAxis scale={y} left={left} title={scoreName} />
      <line x1={left} x2={right} y1={y(0)} y2={y(0)} className="stroke-ink" aria-hidden="true" />
      {thresholdsOf(scoreKind).map((line) => (
        <ThresholdLine key={line.at} {...line} x1={left} x2={right} y={y(line.at)} />
      ))}
      <g aria-hidden="true">
        {runs.map((run) => (
          <LinePath
            key={run[0]?.point.key}
            data={run}
            x={(mark) => mark.x}
            y={(mark) => mark.y}
            className="stroke-ink-faint"
            strokeWidth={1.4}
            fill="none"
          />
        ))}
        {labels.map((label, index) => (
          <RoundLabel key={index} {...label} top={bottom} />
        ))}
      </g>
      {marks.map((mark, index) => (
        <Mark
          key={mark.point.key}
          first={index === 0}
          focusable={focusable}
          detail={`${mark.point.label}: ${scoreName} = ${formatScore(mark.point.score, scoreKind)}${signalWords(mark.point.signal)}${mark.point.note ? `; ${mark.point.note}` : ''}`}
        >
          <circle cx={mark.x} cy={mark.y} r="12" className="fill-transparent" />
          <ResultShape signal={mark.point.signal} x={mark.x} y={mark.y} size={10} />
          {mark.clamped !== 0 && <BeyondEdge mark={mark} scoreKind={scoreKind} />}
        </Mark>
      ))}
    </>
  );
}

function RoundLabel({ text, x, shown, top }: { text: string; x: number; shown: boolean; top: number }) {
  return (
    <>
      <line x1={x} x2={x} y1={top + 6} y2={top + (shown ? 12 : 9)} className="stroke-rule-strong" />
      {shown && (
        <text x={x} y={top + 28} textAnchor="middle" className="fill-ink-soft">
          {text}
        </text>
      )}
    </>
  );
}

function BeyondEdge({ mark, scoreKind }: { mark: TrendMark; scoreKind: ScoreKind }) {
  const outward = mark.clamped === 1 ? -1 : 1;
  return (
    <>
      <EdgeArrow x={mark.x} y={mark.y + outward * 11} direction={outward < 0 ? 'up' : 'down'} />
      <text x={mark.x + 10} y={mark.y} dy="0.35em" className="fill-ink">
        {formatScore(mark.point.score, scoreKind)}
      </text>
    </>
  );
}
