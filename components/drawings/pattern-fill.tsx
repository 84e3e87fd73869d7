import { useId } from 'react';
import type { PartnerMark, PatternKind } from './partner-marks';

function PatternLines({ kind, line, size }: { kind: PatternKind; line: string; size: number }) {
  const half = size / 2;
  const stroke = { stroke: line, strokeWidth: size * 0.26, fill: 'none' };
  switch (kind) {
    case 'solid':
      return null;
    case 'diagonal':
      return (
        <path
          d={`M${-half} ${half} L${half} ${-half} M0 ${size} L${size} 0 M${half} ${size + half} L${size + half} ${half}`}
          {...stroke}
          strokeWidth={size * 0.2}
        />
      );
    case 'back-diagonal':
      return (
        <path
          d={`M${-half} ${half} L${half} ${size + half} M0 0 L${size} ${size} M${half} ${-half} L${size + half} ${half}`}
          {...stroke}
          strokeWidth={size * 0.2}
        />
      );
    case 'vertical':
      return <path d={`M${half} 0 V${size}`} {...stroke} />;
    case 'horizontal':
      return <path d={`M0 ${half} H${size}`} {...stroke} />;
    case 'cross':
      return <path d={`M${half} 0 V${size} M0 ${half} H${size}`} {...stroke} strokeWidth={size * 0.16} />;
    case 'dots':
      return <circle cx={half} cy={half} r={size * 0.24} fill={line} />;
    case 'checks':
      return <path d={`M0 0H${half}V${half}H0Z M${half} ${half}H${size}V${size}H${half}Z`} fill={line} />;
  }
}

/** An area filled with a partner's colour and pattern; fills the element around it, which must be positioned. */
export function PatternFill({
  mark,
  scale = 6,
}: {
  mark: Pick<PartnerMark, 'pattern' | 'fill' | 'line'>;
  scale?: number;
}) {
  const id = useId();
  return (
    <svg aria-hidden width="100%" height="100%" className="absolute inset-0 block">
      <defs>
        <pattern id={id} width={scale} height={scale} patternUnits="userSpaceOnUse">
          <PatternLines kind={mark.pattern} line={mark.line} size={scale} />
        </pattern>
      </defs>
      <rect width="100%" height="100%" fill={mark.fill} />
      {mark.pattern === 'solid' ? null : <rect width="100%" height="100%" fill={`url(#${id})`} />}
    </svg>
  );
}

/** A small square of a partner's colour and pattern, to stand before the name in a key. */
export function PatternSwatch({
  mark,
  className = 'size-3',
}: {
  mark: Pick<PartnerMark, 'pattern' | 'fill' | 'line'>;
  className?: string;
}) {
  return (
    <span
      aria-hidden
      className={`relative inline-block shrink-0 overflow-hidden rounded-[2px] align-baseline ${className}`}
    >
      <PatternFill mark={mark} scale={5} />
    </span>
  );
}
