/** Invented scores in ascending order; the own one stands in the upper half, well within the lines. */
const SCORES = [
  -2.4, -1.7, -1.4, -1.2, -1, -0.8, -0.7, -0.5, -0.4, -0.2, -0.1, 0.1, 0.2, 0.3, 0.5, 0.6, 0.9, 1.1, 1.5, 3.4,
];
const OWN = 16;
const STEP = 19;
const UNIT = 34;
const MIDDLE = 132;
const LEFT = 14;
const WIDTH = LEFT + SCORES.length * STEP + 52;

/** A round as it looks once it is published, for the front page. */
export function RoundSketch() {
  return (
    <figure className="max-w-md">
      <svg
        viewBox={`0 0 ${WIDTH} 252`}
        role="img"
        aria-label="Twenty scores of an invented round in ascending order"
      >
        {[2, -2].map((limit) => (
          <Line key={limit} at={limit} className="stroke-warning" dashes="5 4" />
        ))}
        {[3, -3].map((limit) => (
          <Line key={limit} at={limit} className="stroke-action" />
        ))}
        <line x1={LEFT - 8} x2={WIDTH - 40} y1={MIDDLE} y2={MIDDLE} className="stroke-ink" />
        {SCORES.map((score, index) => (
          <Stroke key={score} score={score} x={LEFT + index * STEP + STEP / 2} isOwn={index === OWN} />
        ))}
      </svg>
      <figcaption className="mt-2 text-sm text-ink-soft">
        A round with invented figures: each stroke is one laboratory, the maize one is yours. The open
        triangle is a warning signal, the filled square an action signal.
      </figcaption>
    </figure>
  );
}

function Line({ at, className, dashes }: { at: number; className: string; dashes?: string }) {
  const y = MIDDLE - at * UNIT;
  return (
    <>
      <line x1={LEFT - 8} x2={WIDTH - 40} y1={y} y2={y} className={className} strokeDasharray={dashes} />
      <text x={WIDTH - 34} y={y} dy="0.35em" className="fill-ink-soft text-[13px] tabular-nums">
        {at > 0 ? `+${at}` : `\u2212${-at}`}
      </text>
    </>
  );
}

function Stroke({ score, x, isOwn }: { score: number; x: number; isOwn: boolean }) {
  const tip = MIDDLE - score * UNIT;
  const beyond = tip + (score > 0 ? -7 : 8);
  const size = Math.abs(score);
  return (
    <>
      <line
        x1={x}
        x2={x}
        y1={MIDDLE}
        y2={tip}
        strokeWidth={isOwn ? 9 : 3}
        className={isOwn ? 'stroke-maize' : 'stroke-ink-soft'}
      />
      {size >= 3 && <path d={`M${x - 5} ${beyond - 5}h10v10h-10Z`} className="fill-action" />}
      {size > 2 && size < 3 && (
        <path
          d={`M${x} ${beyond - 5}l6 10h-12Z`}
          fill="none"
          strokeWidth="1.8"
          strokeLinejoin="round"
          className="stroke-warning"
        />
      )}
    </>
  );
}
