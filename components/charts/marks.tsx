import type { ReactNode } from 'react';
import type { SignalKind } from '@/components/ui/signal';

type MarkProps = { detail: string; focusable: boolean; first?: boolean; children: ReactNode };

/**
 * One datum. The first mark is a tab stop and the arrow keys go on from there (chart-readout.tsx);
 * past the number of marks that a reader can step through, marks are drawing only.
 */
export function Mark({ detail, focusable, first, children }: MarkProps) {
  if (!focusable) return <g data-detail={detail}>{children}</g>;
  return (
    <g role="img" aria-label={detail} data-detail={detail} tabIndex={first ? 0 : -1} className="chart-mark">
      {children}
    </g>
  );
}

type ShapeProps = { x: number; y: number; size: number };

/** The shape that tells a signal: an open triangle, a filled square, and nothing where nothing is wrong. */
export function SignalShape({ signal, x, y, size }: ShapeProps & { signal?: SignalKind }) {
  if (signal === 'warning') return <Triangle x={x} y={y} size={size} />;
  if (signal === 'action') return <Square x={x} y={y} size={size} />;
  return null;
}

function Triangle({ x, y, size }: ShapeProps) {
  const half = size / 2;
  return (
    <path
      d={`M${x} ${y - half}L${x + half} ${y + half * 0.85}H${x - half}Z`}
      className="fill-paper stroke-warning"
      strokeWidth={size > 6 ? 1.8 : 1.2}
      strokeLinejoin="round"
    />
  );
}

function Square({ x, y, size }: ShapeProps) {
  const side = size * 0.9;
  return <rect x={x - side / 2} y={y - side / 2} width={side} height={side} className="fill-action" />;
}

/** Marks a value that lies beyond the drawing: the arrow points to where it is. */
export function EdgeArrow({
  x,
  y,
  direction,
}: {
  x: number;
  y: number;
  direction: 'up' | 'down' | 'left' | 'right';
}) {
  const turn = { up: 0, right: 90, down: 180, left: 270 }[direction];
  return (
    <path
      d="M0 -6 4.5 1.5H-4.5Z"
      transform={`translate(${x} ${y}) rotate(${turn})`}
      className="fill-ink stroke-paper"
      strokeWidth="0.8"
    />
  );
}

/** A result: plain ink dot, the shape of its signal, or the maize disc of the reader's own laboratory. */
export function ResultShape({
  signal,
  own,
  x,
  y,
  size,
}: ShapeProps & { signal?: SignalKind; own?: boolean }) {
  return (
    <>
      {own && (
        <circle cx={x} cy={y} r={size * 0.5 + 2.5} className="fill-maize stroke-ink" strokeWidth="1.4" />
      )}
      {signal === 'warning' || signal === 'action' ? (
        <SignalShape signal={signal} x={x} y={y} size={size} />
      ) : (
        <circle cx={x} cy={y} r={own ? size * 0.25 : size * 0.38} className="fill-ink" />
      )}
    </>
  );
}

const LINE_STYLE = {
  warning: { className: 'stroke-warning', strokeDasharray: '5 4' },
  action: { className: 'stroke-action', strokeDasharray: undefined },
};

/** A labelled line of a score chart; the label stands at the right end. */
export function ThresholdLine(props: {
  x1: number;
  x2: number;
  y: number;
  label: string;
  strength: 'warning' | 'action';
}) {
  const { x1, x2, y, label, strength } = props;
  return (
    <g aria-hidden="true">
      <line x1={x1} x2={x2} y1={y} y2={y} strokeWidth="1" {...LINE_STYLE[strength]} />
      <text x={x2 + 6} y={y} dy="0.35em" className={strength === 'warning' ? 'fill-warning' : 'fill-action'}>
        {label}
      </text>
    </g>
  );
}
