import type { ReactNode } from 'react';
import { View } from 'react-native';
import Svg, { Ellipse } from 'react-native-svg';
import { sectionOf } from '../../shared/domain/section';
import { useTheme } from '../theme/ThemeProvider';
import { radius } from '../theme/tokens';
import { Span, Text } from '../ui/Text';
import { useMeasuredWidth } from './useMeasuredWidth';

interface VersionStampProps {
  /** The version's number as words. */
  label: string;
  /** SHA-256 of the manifest, 64 hexadecimal digits; the section is drawn from it. */
  sha256: string;
  doi: string | null;
  /** Date (and time) of freezing as text. */
  frozen: string;
  /** Frozen in demonstration mode. */
  demo?: boolean;
  /** The tall slide of a version's own page; `facts` then stand under the section. */
  tall?: boolean;
  facts?: readonly { label: string; value: ReactNode }[];
}

/** "37c5…5d8c" */
export function shortChecksum(sha256: string): string {
  return `${sha256.slice(0, 4)}…${sha256.slice(-4)}`;
}

/** The slide: frosted end with the number, glass end with the section drawn from the checksum, DOI, date. */
export function VersionStamp({ label, sha256, doi, frozen, demo, tall, facts }: VersionStampProps) {
  const { colour } = useTheme();
  const { width, onLayout } = useMeasuredWidth();
  const field = { width: Math.max(120, width - 24), height: tall ? 64 : 44 };
  return (
    <View role="group" aria-label={`Version ${label}, frozen ${frozen}`} style={{ flexDirection: 'row', borderWidth: 1, borderColor: colour.hairline, borderRadius: radius.stamp, backgroundColor: colour.sheet, overflow: 'hidden' }}>
      <View style={{ width: tall ? 112 : 84, flexShrink: 0, backgroundColor: colour.frost, justifyContent: 'center', paddingLeft: tall ? 20 : 14, paddingVertical: 8 }}>
        <Text science italic size={tall ? 'body' : 'secondary'} tone="inkSoft">
          version
        </Text>
        <Text science weight="semibold" style={{ fontSize: tall ? 60 : 38, lineHeight: tall ? 66 : 42 }}>
          {label}
        </Text>
      </View>
      <View onLayout={onLayout} style={{ flex: 1, minWidth: 0, paddingHorizontal: 12, paddingVertical: 8, gap: 4, justifyContent: 'center' }}>
        {width > 0 ? <Section sha256={sha256} {...field} /> : <View style={{ height: field.height }} />}
        {facts ? (
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: 18, rowGap: 4 }}>
            {facts.map((fact) => (
              <View key={fact.label}>
                <Text size="least" tone="inkSoft">
                  {fact.label}
                </Text>
                <Text size="table" weight="semibold">
                  {fact.value}
                </Text>
              </View>
            ))}
          </View>
        ) : (
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: 18 }}>
            <Text size="secondary" weight="semibold">
              {doi ?? 'no DOI yet'}
            </Text>
            <Text size="secondary" tone="inkSoft">
              frozen {frozen}
            </Text>
            <Text size="secondary" tone="inkSoft">
              sha256 {shortChecksum(sha256)}
            </Text>
            {demo ? (
              <Text size="secondary" tone="waiting" weight="semibold">
                demonstration
              </Text>
            ) : null}
          </View>
        )}
      </View>
    </View>
  );
}

function Section({ sha256, width, height }: { sha256: string; width: number; height: number }) {
  const { colour } = useTheme();
  return (
    <Svg width={width} height={height} role="img" aria-label={`Section drawn from the checksum ${shortChecksum(sha256)}`}>
      {sectionOf(sha256, { width, height }).map(({ cx, cy, rx, ry, angleDegrees, opacity }, index) => (
        <Ellipse key={index} cx={cx} cy={cy} rx={rx} ry={ry} transform={`rotate(${angleDegrees} ${cx} ${cy})`} fill={colour.cresyl} fillOpacity={opacity} />
      ))}
    </Svg>
  );
}

/** The stamp in one line, for captions and rows. */
export function VersionLine({ label, sha256, doi, frozen }: Pick<VersionStampProps, 'label' | 'doi' | 'frozen'> & { sha256?: string }) {
  const { colour } = useTheme();
  return (
    <Text size="secondary" tone="inkSoft">
      <Span science italic style={{ backgroundColor: colour.frost }}>
        {' '}
        version {label}{' '}
      </Span>
      {` ${[doi, `frozen ${frozen}`, sha256 ? `sha256 ${shortChecksum(sha256)}` : null].filter(Boolean).join(' · ')}`}
    </Text>
  );
}
