import type { Href } from 'expo-router';
import { useEffect, useRef } from 'react';
import { View } from 'react-native';
import { RoleGate } from '../layout/RoleGate';
import { Screen } from '../layout/Screen';
import { timeText } from '../layout/timeText';
import { errorInWords } from '../queries/errorInWords';
import { useMarkNoticesRead, useNotices } from '../queries/people';
import { useTheme } from '../theme/ThemeProvider';
import { QueryView } from '../ui/QueryView';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';

/** What the register told this person, newest first; looking at them marks them as read. */
export function NoticesScreen() {
  return (
    <RoleGate title="Notices">
      <Notices />
    </RoleGate>
  );
}

function Notices() {
  const notices = useNotices(true);
  const { mutate: markRead } = useMarkNoticesRead();
  const { colour } = useTheme();
  const marked = useRef(false);
  const unread = notices.data?.items.some((notice) => notice.readAt === null) ?? false;
  useEffect(() => {
    if (!unread || marked.current) return;
    marked.current = true;
    markRead();
  }, [unread, markRead]);
  return (
    <Screen title="Notices" sub="The same is sent by mail to those who must act.">
      <QueryView
        pending={notices.isPending}
        error={notices.error ? errorInWords(notices.error) : null}
        data={notices.data}
        isEmpty={(page) => page.items.length === 0}
        empty={{ title: 'Nothing yet.', text: 'Decisions, comments and re-checks that concern you are told here.', action: { label: 'To the register', href: '/' } }}
        onRetry={() => void notices.refetch()}
      >
        {(page) => (
          <View role="list">
            {page.items.map((notice) => (
              <View key={notice.id} role="listitem" style={{ paddingVertical: 12, gap: 2, borderBottomWidth: 1, borderBottomColor: colour.hairline, maxWidth: 720 }}>
                <TextLink href={notice.href as Href}>{notice.subject}</TextLink>
                {notice.body ? <Text size="table">{notice.body}</Text> : null}
                <Text size="secondary" tone="inkSoft">
                  {`${timeText(notice.createdAt)}${notice.readAt === null ? ' · new' : ''}`}
                </Text>
              </View>
            ))}
          </View>
        )}
      </QueryView>
    </Screen>
  );
}
