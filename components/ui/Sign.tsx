import Svg, { Circle, Path, Rect } from 'react-native-svg';
import { useTheme } from '../theme/ThemeProvider';
import type { Tone } from '../theme/tokens';

export type SignName = 'check' | 'clock' | 'ring' | 'cross' | 'pencil' | 'bar' | 'dash' | 'reticle' | 'hatch' | 'chevron' | 'search' | 'plus' | 'file' | 'close';

interface SignProps {
  name: SignName;
  tone?: Tone;
  size?: number;
}

/** A small drawn sign; always stands beside its word, so it is hidden from assistive technology. */
export function Sign({ name, tone = 'ink', size = 16 }: SignProps) {
  const { colour } = useTheme();
  const ink = colour[tone];
  const stroke = { stroke: ink, strokeWidth: 1.8, fill: 'none', strokeLinecap: 'round', strokeLinejoin: 'round' } as const;
  return (
    <Svg width={size} height={size} viewBox="0 0 16 16" aria-hidden={true}>
      {name === 'check' && <Path d="M2.5 8.6L6.2 12.2L13.5 4.2" {...stroke} />}
      {name === 'clock' && (
        <>
          <Circle cx={8} cy={8} r={6.3} {...stroke} />
          <Path d="M8 4.4V8.2H11" {...stroke} strokeWidth={1.6} />
        </>
      )}
      {name === 'ring' && (
        <>
          <Circle cx={8} cy={8} r={6.3} {...stroke} />
          <Circle cx={8} cy={8} r={2.6} fill={ink} />
        </>
      )}
      {name === 'cross' && (
        <>
          <Rect x={2} y={2} width={12} height={12} fill={ink} />
          <Path d="M5.6 5.6L10.4 10.4M10.4 5.6L5.6 10.4" stroke={colour.sheet} strokeWidth={1.6} />
        </>
      )}
      {name === 'pencil' && <Path d="M3 13L3.6 10.2L10.9 2.9L13.1 5.1L5.8 12.4Z" {...stroke} strokeWidth={1.5} />}
      {name === 'bar' && (
        <>
          <Rect x={2.6} y={2.6} width={10.8} height={10.8} {...stroke} strokeLinejoin="miter" />
          <Path d="M5.4 8H10.6" {...stroke} strokeLinecap="butt" />
        </>
      )}
      {name === 'dash' && <Path d="M3.5 8H12.5" {...stroke} />}
      {name === 'reticle' && (
        <>
          <Path d="M8 0.8V15.2M0.8 8H15.2" {...stroke} strokeWidth={1.5} strokeLinecap="butt" />
          <Rect x={4.7} y={4.7} width={6.6} height={6.6} rx={1.6} fill={ink} />
        </>
      )}
      {name === 'hatch' && (
        <>
          <Rect x={2.5} y={2.5} width={11} height={11} {...stroke} strokeWidth={1} />
          <Path d="M2.5 7.5L7.5 2.5M2.5 13.5L13.5 2.5M7.5 13.5L13.5 7.5" {...stroke} strokeWidth={1} />
        </>
      )}
      {name === 'chevron' && <Path d="M3 5.8L8 10.6L13 5.8" {...stroke} />}
      {name === 'search' && (
        <>
          <Circle cx={6.8} cy={6.8} r={4.8} {...stroke} />
          <Path d="M10.4 10.4L14.2 14.2" {...stroke} />
        </>
      )}
      {name === 'plus' && <Path d="M8 3V13M3 8H13" {...stroke} />}
      {name === 'file' && <Path d="M4 1.8H9.6L12.4 4.6V14.2H4Z" {...stroke} strokeWidth={1.4} />}
      {name === 'close' && <Path d="M3.6 3.6L12.4 12.4M12.4 3.6L3.6 12.4" {...stroke} />}
    </Svg>
  );
}
