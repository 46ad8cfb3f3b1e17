import { EdgeArrow } from './marks';

type EdgeValueProps = { x: number; y: number; labelX: number; text: string; up: boolean };

/** An arrow at the edge and the value it points to, written upright along the arrow. */
export function EdgeValue({ x, y, labelX, text, up }: EdgeValueProps) {
  const outward = up ? -1 : 1;
  return (
    <>
      <EdgeArrow x={x} y={y + outward * 3} direction={up ? 'up' : 'down'} />
      <text
        transform={`translate(${labelX} ${y + outward * 12}) rotate(-90)`}
        textAnchor={up ? 'start' : 'end'}
        dy="0.35em"
        className="fill-ink"
      >
        {text}
      </text>
    </>
  );
}
