type SigmaLabelProps = {
  multiple: -3 | -2 | 0 | 2 | 3;
  x: number;
  y: number;
  textAnchor: 'start' | 'middle' | 'end';
};

const COLOURS = { 0: 'fill-ink', 2: 'fill-warning', 3: 'fill-action' };

/** Names a line: x with the index pt, or so many sigma on one side of it. */
export function SigmaLabel({ multiple, x, y, textAnchor }: SigmaLabelProps) {
  const size = Math.abs(multiple) as 0 | 2 | 3;
  if (multiple === 0) {
    return (
      <text x={x} y={y} dy="0.35em" textAnchor={textAnchor} className="fill-ink font-semibold">
        <tspan fontStyle="italic">x</tspan>
        <tspan dy="0.3em" fontSize="0.75em">
          pt
        </tspan>
      </text>
    );
  }
  return (
    <text x={x} y={y} dy="0.35em" textAnchor={textAnchor} className={COLOURS[size]}>
      {multiple > 0 ? '+' : '\u2212'}
      {size}
      {'\u03c3'}
    </text>
  );
}
