import { useEffect, useState } from 'react';
import { AccessibilityInfo } from 'react-native';
import Svg, { Line } from 'react-native-svg';

const decades = 2;
const positions = Array.from({ length: decades * 9 + 1 }, (_, index) => Math.floor(index / 9) + Math.log10((index % 9) + 1));

interface ProgressTicksProps {
  colour: string;
  /** 0 to 1 where the work can say how far it is; without it the ticks fill over and over. */
  progress?: number;
  width?: number;
}

/** Log ticks that fill from the left while something works. */
export function ProgressTicks({ colour, progress, width = 44 }: ProgressTicksProps) {
  const [step, setStep] = useState(0);
  useEffect(() => {
    if (progress !== undefined) return;
    let timer: ReturnType<typeof setInterval> | undefined;
    let gone = false;
    void AccessibilityInfo.isReduceMotionEnabled().then((reduced) => {
      if (!reduced && !gone) timer = setInterval(() => setStep((now) => (now + 1) % (positions.length + 4)), 90);
    });
    return () => {
      gone = true;
      clearInterval(timer);
    };
  }, [progress]);
  const filled = progress === undefined ? step : Math.round(progress * positions.length);
  return (
    <Svg width={width} height={14} viewBox="0 0 44 14" aria-hidden={true}>
      <Line x1={0} x2={44} y1={7} y2={7} stroke={colour} strokeWidth={1} opacity={0.5} />
      {positions.map((position, index) => {
        const x = 1 + (position / decades) * 42;
        const half = index % 9 === 0 ? 6 : 3.5;
        return <Line key={position} x1={x} x2={x} y1={7 - half} y2={7 + half} stroke={colour} strokeWidth={1.4} opacity={index < filled ? 1 : 0.35} />;
      })}
    </Svg>
  );
}
