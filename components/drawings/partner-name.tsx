import { partnerMark } from './partner-marks';
import { PatternSwatch } from './pattern-fill';

/** A partner's name in its colour, with its pattern in front, so that it reads without colour too. */
export function PartnerName({
  partner,
  name,
  swatch = true,
}: {
  partner: number;
  name: string;
  swatch?: boolean;
}) {
  const mark = partnerMark(partner);
  return (
    <span className="inline-flex items-baseline gap-1.5 font-semibold" style={{ color: mark.text }}>
      {swatch ? <PatternSwatch mark={mark} /> : null}
      {name}
    </span>
  );
}
