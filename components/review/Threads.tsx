import { useState } from 'react';
import { View } from 'react-native';
import type { Change, CommentView, SubmissionDetail } from '../../shared/contracts/submissions';
import { fieldName } from '../../shared/domain/fieldNames';
import { timeText } from '../layout/timeText';
import { ChangedValue, Thread } from '../marks/Thread';
import { errorInWords } from '../queries/errorInWords';
import { useComment } from '../queries/submissions';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';

interface ThreadsProps {
  detail: Pick<SubmissionDetail, 'id' | 'revision' | 'status' | 'content' | 'comments' | 'changes' | 'may'>;
}

function groupByField(comments: readonly CommentView[]): [string, CommentView[]][] {
  const groups = new Map<string, CommentView[]>();
  for (const comment of comments) groups.set(comment.fieldPath, [...(groups.get(comment.fieldPath) ?? []), comment]);
  return [...groups];
}

/** Words about fields, each at its field, with what the newest revision made of it. */
export function Threads({ detail }: ThreadsProps) {
  const groups = groupByField(detail.comments);
  const rest = detail.changes.filter((change) => !groups.some(([path]) => change.path.startsWith(path)));
  return (
    <View style={{ gap: 16 }}>
      {groups.map(([path, comments]) => (
        <FieldThread key={path} detail={detail} path={path} comments={comments} change={detail.changes.find((change) => change.path.startsWith(path)) ?? null} />
      ))}
      {rest.length > 0 ? <Changes changes={rest} detail={detail} /> : null}
    </View>
  );
}

function FieldThread({ detail, path, comments, change }: ThreadsProps & { path: string; comments: readonly CommentView[]; change: Change | null }) {
  const [text, setText] = useState('');
  const send = useComment(detail.id);
  const name = fieldName(path, detail.content);
  // A draft takes no comments: until it is submitted, an answer stands at the revision that was asked about.
  const revision = detail.status === 'draft' ? (comments.at(-1)?.revision ?? detail.revision) : detail.revision;
  return (
    <Thread
      field={name}
      revisions={detail.revision > 1 ? `revision ${detail.revision - 1} → ${detail.revision}` : undefined}
      change={change ? { from: change.before || 'empty', to: change.after || 'empty' } : null}
      comments={comments.map((comment) => ({ key: comment.id, who: comment.author.name, when: timeText(comment.createdAt), text: comment.text }))}
      answer={
        detail.may.comment
          ? {
              value: text,
              onChange: setText,
              onSend: () => (text.trim() === '' ? undefined : send.mutate({ revision, fieldPath: path, text }, { onSuccess: () => setText('') })),
              working: send.isPending,
              label: `Answer at ${name}`,
              error: send.error ? errorInWords(send.error).text : undefined,
            }
          : undefined
      }
    />
  );
}

function Changes({ changes, detail }: { changes: readonly Change[] } & ThreadsProps) {
  return (
    <Section title={`Changed since revision ${detail.revision - 1}`} look="small">
      {changes.map((change) => (
        <View key={change.path} style={{ paddingVertical: 6 }}>
          <Text size="secondary" tone="inkSoft">
            {fieldName(change.path, detail.content)}
          </Text>
          <ChangedValue from={change.before || 'empty'} to={change.after || 'empty'} />
        </View>
      ))}
    </Section>
  );
}
