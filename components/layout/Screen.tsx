import Head from 'expo-router/head';
import type { ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { useAccount } from '../queries/account';
import { useTheme } from '../theme/ThemeProvider';
import { margin } from '../theme/tokens';
import type { HeadingLook } from '../theme/typography';
import { Text } from '../ui/Text';
import { AccountLink } from './AccountLink';
import { DemoMark } from '../marks/DemoMark';
import { PageHeading } from './PageHeading';
import { useBreakpoint } from './useBreakpoint';

export const MAIN_ID = 'content';

export interface ScreenProps {
  /** Title of the page in the browser; also the heading unless `heading` is given. */
  title: string;
  heading?: ReactNode;
  /** `species` sets the heading in italic. */
  headingLook?: Extract<HeadingLook, 'page' | 'species'>;
  /** After the heading on its line, in Source Sans: a specimen's code. */
  headingEnd?: ReactNode;
  /** Under the heading. */
  sub?: ReactNode;
  description?: string;
  /** Above the heading: BackLink or Breadcrumb. */
  back?: ReactNode;
  /** At the right of the heading; below it on a phone. */
  actions?: ReactNode;
  /** At the right of the line of `back` on a phone: a state, a quiet act. */
  topEnd?: ReactNode;
  /** A list at the left from 900 px (its own scroll); a phone shows the page alone. */
  list?: ReactNode;
  /** Fixed row at the foot, above the bar. */
  foot?: ReactNode;
  /** Content stands on sheet instead of ground (beside a list). */
  onSheet?: boolean;
  /** Page carries invented data, whatever the register's mode. */
  demonstration?: boolean;
  /** The register's own page on a phone: account at the top right. */
  accountLink?: boolean;
  children: ReactNode;
}

/** A page: title, one h1 that takes focus after navigation, margins, its own scroll, the main landmark. */
export function Screen(props: ScreenProps) {
  const { title, heading, headingLook, headingEnd, sub, description, back, actions, topEnd, list, foot, onSheet, demonstration, accountLink, children } = props;
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  const { demo } = useAccount();
  const edge = wide ? (list ? 32 : margin.wide) : margin.phone;
  const marked = demo || demonstration;
  const hasTop = Boolean(back ?? topEnd) || (accountLink && !wide);
  return (
    <View style={{ flex: 1, minHeight: 0, flexDirection: 'row' }}>
      <Head>
        <title>{`${title} · Allokarya`}</title>
        {description ? <meta name="description" content={description} /> : null}
      </Head>
      {wide && list ? (
        <View role="complementary" aria-label="List" style={{ width: 260, flexShrink: 0, borderRightWidth: 1, borderRightColor: colour.hairline }}>
          {list}
        </View>
      ) : null}
      <View role="main" id={MAIN_ID} tabIndex={-1} style={{ flex: 1, minWidth: 0, minHeight: 0, backgroundColor: onSheet && wide ? colour.sheet : colour.ground }}>
        {/* Reached by Tab, so that a page of text alone scrolls by the keyboard too. */}
        <ScrollView tabIndex={0} style={{ flex: 1, minHeight: 0 }} contentContainerStyle={{ paddingHorizontal: edge, paddingTop: wide ? 24 : 8, paddingBottom: 32, gap: wide ? 28 : 22, maxWidth: 1680 }}>
          <View style={{ gap: 2 }}>
            {hasTop ? (
              <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'center', gap: 12, minHeight: wide ? 24 : 40 }}>
                {accountLink && !wide ? <BrandName /> : <View>{back}</View>}
                {accountLink && !wide ? <AccountLink /> : topEnd}
              </View>
            ) : null}
            <View style={{ flexDirection: 'row', flexWrap: wide ? 'nowrap' : 'wrap', justifyContent: 'space-between', alignItems: 'flex-start', columnGap: 24, rowGap: 10 }}>
              <View style={{ flexShrink: 1, minWidth: 0 }}>
                <PageHeading look={headingLook} end={headingEnd}>
                  {heading ?? title}
                </PageHeading>
                {typeof sub === 'string' ? (
                  <Text size="table" tone="inkSoft">
                    {sub}
                  </Text>
                ) : (
                  sub
                )}
              </View>
              {actions ? <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10, flexShrink: 0, maxWidth: '100%' }}>{actions}</View> : null}
            </View>
          </View>
          {children}
          {marked ? <DemoMark words={demonstration ? 'demonstration data' : 'demonstration register: it holds invented data'} /> : null}
        </ScrollView>
        {foot ? (
          <View style={{ flexDirection: 'row', alignItems: 'center', gap: 10, paddingHorizontal: edge, paddingVertical: 10, borderTopWidth: 1, borderTopColor: colour.hairline, backgroundColor: colour.ground }}>{foot}</View>
        ) : null}
      </View>
    </View>
  );
}

function BrandName() {
  return (
    <Text science style={{ fontSize: 22, lineHeight: 28 }}>
      Allokarya
    </Text>
  );
}
