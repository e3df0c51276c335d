import { color } from '../../theme/tokens';
import { Glyph } from '../../ui/Glyph';

/** The trail line with nothing on it yet. */
export function EmptyTrail() {
  return (
    <Glyph size={136} height={18} box="0 0 136 18">
      <g fill={color.card} stroke={color.edge} strokeWidth={1.8}>
        <path d="M9 9H127" />
        <rect x={3} y={3} width={12} height={12} />
        <circle cx={68} cy={9} r={6.6} />
        <path d="M127 1.4l7.6 7.6l-7.6 7.6l-7.6 -7.6Z" />
      </g>
    </Glyph>
  );
}
